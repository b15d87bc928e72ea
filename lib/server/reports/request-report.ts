import 'server-only'
import type { WriteContext } from '../context'
import { newId } from '../identity'
import { enqueue } from '../jobs/enqueue'

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
