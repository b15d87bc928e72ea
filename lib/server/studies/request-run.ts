import 'server-only'
import { ENGINE_VERSION } from '@/lib/engine/version'
import { DomainError } from '@/lib/errors'
import type { WriteContext } from '../context'
import { newId } from '../identity'
import { enqueue } from '../jobs/enqueue'
import { lostAfter } from '../jobs/job'
import type { Done } from '../perform'
import { inputHashOf } from './input-hash-of'
import { loadLiveStudy } from './live-study'
import type { StudyRow } from './study-of'

const open = { state: { in: ['queued', 'running'] } }

/** Puts a computation of the study into the queue, within the transaction; a running one is answered instead. */
export async function requestRun(
  context: WriteContext,
  { id: studyId, projectId }: StudyRow,
): Promise<Done<{ runId: string }>> {
  const { tx, place, actor, at } = context
  const { organisationId } = place
  await giveUpLost(context, studyId)
  const running = await tx.studyRun.findFirst({ where: { studyId, ...open } })
  if (running) return { answer: { runId: running.id }, events: [] }
  const { document, problems } = await loadLiveStudy(tx, studyId)
  if (!document) throw new DomainError('invalid', 'The study cannot be computed yet: correct what is marked.', problems)
  if (document.cases.length === 0) throw new DomainError('invalid', 'There is nothing to compute: add a case first.')
  const runId = newId()
  const inputHash = await inputHashOf(document)
  await tx.studyRun.create({
    data: {
      organisationId,
      projectId,
      studyId,
      id: runId,
      state: 'queued',
      inputHash,
      engineVersion: ENGINE_VERSION,
      of: document.cases.length,
      requestedById: actor.userId,
      requestedByName: actor.name,
      queuedAt: at,
    },
  })
  await enqueue(tx, 'compute', { organisationId, runId })
  return {
    answer: { runId },
    events: [{ action: 'computing-asked', subject: { kind: 'study', id: studyId }, payload: { runId, inputHash } }],
  }
}

/** A run whose every try was killed says nothing any more and would stand in the way of the next for ever. */
async function giveUpLost({ tx, at }: WriteContext, studyId: string): Promise<void> {
  const before = new Date(at.getTime() - lostAfter)
  await tx.studyRun.updateMany({
    where: { studyId, ...open, queuedAt: { lt: before }, OR: [{ startedAt: null }, { startedAt: { lt: before } }] },
    data: { state: 'failed', failure: 'The computation broke off and did not come back.', finishedAt: at },
  })
}

/** Ends the running computation; its worker notices at its next report of progress. */
export async function stopRun({ tx, at }: WriteContext, studyId: string): Promise<Done<{ stopped: boolean }>> {
  const running = await tx.studyRun.findFirst({ where: { studyId, ...open } })
  if (!running) return { answer: { stopped: false }, events: [] }
  await tx.studyRun.updateMany({ where: { id: running.id, ...open }, data: { state: 'stopped', finishedAt: at } })
  return {
    answer: { stopped: true },
    events: [{ action: 'computing-stopped', subject: { kind: 'study', id: studyId }, payload: { runId: running.id } }],
  }
}
