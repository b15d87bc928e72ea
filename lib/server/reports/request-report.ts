import 'server-only'
import { DomainError } from '@/lib/errors'
import type { WriteContext } from '../context'
import { newId } from '../identity'
import { enqueue } from '../jobs/enqueue'
import { lostAfter } from '../jobs/job'
import type { Done } from '../perform'
import { currentReport } from '../revisions/current-report'

/** Puts the rendering of a revision's report into the queue, within the transaction. */
export async function requestReport(
  { tx, place: { organisationId }, at }: WriteContext,
  revisionId: string,
  kind: 'draft' | 'final',
): Promise<string> {
  const id = newId()
  await tx.report.create({ data: { organisationId, id, revisionId, kind, state: 'queued', queuedAt: at } })
  await enqueue(tx, 'render', { organisationId, reportId: id })
  return id
}

/** Asks again for the report that is missing: the final one once the review is closed, the draft before. */
export async function requestReportAgain(
  context: WriteContext,
  { id: revisionId, state }: { id: string; state: string },
): Promise<Done<{ reportId: string }>> {
  const { tx, at } = context
  const { renderState } = await currentReport(tx, revisionId)
  const kind = state === 'review-closed' ? 'final' : 'draft'
  const lost = new Date(at.getTime() - lostAfter)
  const given = await tx.report.updateMany({
    where: { revisionId, kind, state: { in: ['queued', 'running'] }, queuedAt: { lt: lost } },
    data: { state: 'failed', failure: 'The rendering broke off and did not come back.', finishedAt: at },
  })
  if (renderState !== 'failed' && renderState !== 'none' && given.count === 0) {
    throw new DomainError('wrong-state', 'The report is there, or being rendered: reload the page.')
  }
  const reportId = await requestReport(context, revisionId, kind)
  return {
    answer: { reportId },
    events: [{ action: 'report-asked', subject: { kind: 'revision', id: revisionId }, payload: { kind, reportId } }],
  }
}
