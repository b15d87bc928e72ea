import 'server-only'
import type { CaseSummary, StudySummary } from '@/lib/study/summary'
import type { Prisma } from '@/prisma/generated/client'
import type { Tx } from '../db'
import type { RunProgress, RunState } from './view'

/** The run's verdicts and its cases put together again; rows are written only by the job, from the engine's own result. */
export async function loadSummary(tx: Tx, run: { id: string; result: Prisma.JsonValue }): Promise<StudySummary> {
  const cases = await tx.caseRun.findMany({
    where: { runId: run.id },
    orderBy: { position: 'asc' },
    select: { summary: true },
  })
  const rest = run.result as unknown as Omit<StudySummary, 'cases'>
  return { ...rest, cases: cases.map(({ summary }) => summary as unknown as CaseSummary) }
}

/** The last finished run of a study. */
export const lastDone = (tx: Tx, studyId: string) =>
  tx.studyRun.findFirst({ where: { studyId, state: 'done' }, orderBy: { finishedAt: 'desc' } })

const states = ['queued', 'running', 'done', 'failed', 'stopped'] as const

const latestOf = (tx: Tx, studyId: string) =>
  tx.studyRun.findFirst({ where: { studyId }, orderBy: { queuedAt: 'desc' }, omit: { result: true } })

const present = (run: Awaited<ReturnType<typeof latestOf>>): RunProgress => ({
  state: states.find((state) => state === run?.state) ?? 'none',
  runId: run?.id ?? null,
  done: run?.done ?? 0,
  of: run?.of ?? 0,
  failure: run?.failure ?? null,
  requestedBy: run?.requestedByName ?? null,
  finishedAt: run?.finishedAt?.toISOString() ?? null,
})

/** How far the last computation has come, without its results. */
export const loadProgress = async (tx: Tx, studyId: string): Promise<RunProgress> =>
  present(await latestOf(tx, studyId))

/** Where the computation stands. `currentHash` is the hash of what would be computed now; null when the study is not complete. */
export async function loadRunState(tx: Tx, studyId: string, currentHash: string | null): Promise<RunState> {
  const done = await lastDone(tx, studyId)
  return {
    ...(await loadProgress(tx, studyId)),
    result: done ? await loadSummary(tx, done) : null,
    stale: done !== null && done.inputHash !== currentHash,
  }
}
