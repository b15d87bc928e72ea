import 'server-only'
import type { CaseSeries } from '@/lib/engine/case-result'
import type { StudyResult } from '@/lib/engine/study-run'
import { summarise } from '@/lib/study/summary'
import { appendEvents, lockHead } from '../audit'
import { now } from '../clock'
import type { Database, Tx } from '../db'
import { enterAsJob } from '../enter'
import { packSeries } from '../series'
import { toJson } from '../to-json'
import type { ClaimedRun } from './claim-run'
import { enqueue } from './enqueue'

const system = { userId: null, name: 'Breakaway' }

/** The row of a run as long as this claim holds it. */
const held = ({ runId, attempt }: ClaimedRun) => ({ id: runId, attempt, state: 'running' })

/** Says how many cases are done; false when the run was stopped or is somebody else's. */
export const reportProgress = (db: Database, run: ClaimedRun, done: number): Promise<boolean> =>
  db.$transaction(async (tx) => {
    await enterAsJob(tx, run.organisationId)
    const { count } = await tx.studyRun.updateMany({ where: held(run), data: { done } })
    return count === 1
  })

/** Stores all results of a run in one transaction, or none when the run is no longer held. The answer says which. */
export async function storeResults(db: Database, run: ClaimedRun, result: StudyResult): Promise<boolean> {
  const { cases, ...verdicts } = summarise(result)
  const packed: (Uint8Array<ArrayBuffer> | null)[] = []
  for (const { series } of result.cases) packed.push(isEmpty(series) ? null : await packSeries(series))
  return commit(db, run, async (tx) => {
    const { count } = await tx.studyRun.updateMany({
      where: { ...held(run), inputHash: run.inputHash },
      data: {
        state: 'done',
        done: cases.length,
        engineVersion: result.engineVersion,
        result: toJson(verdicts),
        finishedAt: now(),
      },
    })
    if (count === 0) return null
    const { organisationId, runId } = run
    await tx.caseRun.createMany({
      data: cases.map((summary, position) => ({
        organisationId,
        runId,
        caseId: summary.caseId,
        position,
        summary: toJson(summary),
        series: packed[position] ?? null,
      })),
    })
    return {
      action: 'computing-finished',
      payload: { runId, word: result.overall.word, counts: result.overall.counts },
    }
  })
}

const isEmpty = (series: CaseSeries): boolean => series.time.length === 0

/** Ends a run with a sentence for its readers. */
export const failRun = (db: Database, run: ClaimedRun, failure: string): Promise<boolean> =>
  commit(db, run, async (tx) => {
    const { count } = await tx.studyRun.updateMany({
      where: held(run),
      data: { state: 'failed', failure, finishedAt: now() },
    })
    return count === 0 ? null : { action: 'computing-failed', payload: { runId: run.runId, failure } }
  })

/** Gives a run back to the queue, as new. */
export const handBackRun = (db: Database, run: ClaimedRun): Promise<void> =>
  db.$transaction(async (tx) => {
    await enterAsJob(tx, run.organisationId)
    const { count } = await tx.studyRun.updateMany({ where: held(run), data: { state: 'queued', done: 0 } })
    if (count === 1) await enqueue(tx, 'compute', { organisationId: run.organisationId, runId: run.runId })
  })

/** Writes under the lock of the project's head row, with an event if anything was written. */
function commit(
  db: Database,
  run: ClaimedRun,
  write: (tx: Tx) => Promise<{ action: string; payload: Record<string, unknown> } | null>,
): Promise<boolean> {
  const { organisationId, projectId, studyId } = run
  return db.$transaction(async (tx) => {
    await enterAsJob(tx, organisationId)
    const head = await lockHead(tx, organisationId, projectId)
    const event = await write(tx)
    if (!event) return false
    await appendEvents(tx, head, system, now(), [{ ...event, subject: { kind: 'study', id: studyId } }])
    return true
  })
}
