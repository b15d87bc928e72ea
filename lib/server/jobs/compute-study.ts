import 'server-only'
import type { StudyResult } from '@/lib/engine/study-run'
import { DomainError } from '@/lib/errors'
import type { StudyDocument } from '@/lib/study/document/study-document'
import type { Database } from '../db'
import { claimRun } from './claim-run'
import type { JobIds } from './enqueue'
import { failRun, handBackRun, reportProgress, storeResults } from './finish-run'
import { JobInterrupted, type JobTry } from './job'

/** Computes a document outside this thread; says how many cases are done; ends by throwing when the signal is aborted. */
export type ComputeCases = (
  document: StudyDocument,
  options: { onProgress: (done: number, of: number) => void; signal: AbortSignal },
) => Promise<StudyResult>

/** How often a run looks whether it is still wanted, and says how far it is. Milliseconds. */
const interval = 500

/** Carries out one computation. It may run twice, or beside another worker's: only who holds the run at the end stores results. */
export async function computeStudyJob(
  db: Database,
  ids: JobIds['compute'],
  compute: ComputeCases,
  { stopping, last }: JobTry,
): Promise<void> {
  const run = await claimRun(db, ids)
  if (!run) return
  const unwanted = new AbortController()
  let done = 0
  const watch = setInterval(async () => {
    const wanted = await reportProgress(db, run, done).catch(() => true)
    if (!wanted) unwanted.abort(new JobInterrupted('taken-over'))
  }, interval)
  const signal = AbortSignal.any([unwanted.signal, stopping])
  try {
    const onProgress = (count: number) => {
      done = count
    }
    const result = await compute(run.document, { onProgress, signal })
    clearInterval(watch)
    await storeResults(db, run, result)
  } catch (error) {
    clearInterval(watch)
    if (unwanted.signal.aborted) return
    if (stopping.aborted) return handBackRun(db, run)
    if (error instanceof DomainError) {
      await failRun(db, run, error.message)
      return
    }
    if (last)
      await failRun(
        db,
        run,
        'The computation broke off because of an error here, not in your records: ask for it again.',
      )
    throw error
  }
}
