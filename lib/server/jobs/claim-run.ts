import 'server-only'
import { DomainError } from '@/lib/errors'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { now } from '../clock'
import type { Database } from '../db'
import { enterAsJob } from '../enter'
import { inputHashOf } from '../studies/input-hash-of'
import { loadLiveStudy } from '../studies/live-study'
import type { JobIds } from './enqueue'

/** A run that this worker holds: it may write for it as long as nobody has claimed it after. */
export interface ClaimedRun {
  organisationId: string
  projectId: string
  studyId: string
  runId: string
  attempt: number
  inputHash: string
  document: StudyDocument
}

/**
 * Takes a run and reads what is to be computed; null when it was stopped or is done already. The run's input hash becomes that of what
 * was read, so that its results are never taken for those of other records.
 * A study that can no longer be computed ends its run with the reason, and is answered by null as well.
 */
export function claimRun(db: Database, { organisationId, runId }: JobIds['compute']): Promise<ClaimedRun | null> {
  return db.$transaction(async (tx) => {
    await enterAsJob(tx, organisationId)
    const open = { id: runId, state: { in: ['queued', 'running'] } }
    const taken = await tx.studyRun.updateMany({
      where: open,
      data: { state: 'running', attempt: { increment: 1 }, startedAt: now(), done: 0 },
    })
    if (taken.count === 0) return null
    const { projectId, studyId, attempt } = await tx.studyRun.findFirstOrThrow({ where: { id: runId } })
    try {
      const { document, problems } = await loadLiveStudy(tx, studyId)
      if (!document)
        throw new DomainError('invalid', 'The study is not complete any more: correct what is marked.', problems)
      const inputHash = await inputHashOf(document)
      await tx.studyRun.updateMany({ where: open, data: { inputHash, of: document.cases.length } })
      return { organisationId, projectId, studyId, runId, attempt, inputHash, document }
    } catch (error) {
      if (error instanceof DomainError) {
        // kept, not thrown: that would undo it
        const data = { state: 'failed', failure: error.message, finishedAt: now() }
        await tx.studyRun.updateMany({ where: open, data })
        return null
      }
      throw error
    }
  })
}
