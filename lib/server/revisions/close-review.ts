import 'server-only'
import { DomainError } from '@/lib/errors'
import { lockHead } from '../audit'
import type { WriteContext } from '../context'
import type { Done } from '../perform'
import { requestReport } from '../reports/request-report'
import { holdUpsOf, unsettled } from '../reviews/hold-ups'
import { type Moved, moveRevision } from './move'
import type { RevisionWithSubject } from './subject'

/** Fixes the purpose and the head of the audit chain that the report will name, and asks for the final report. */
export async function closeReviewOf(
  context: WriteContext,
  row: RevisionWithSubject,
  purpose: string,
  note: string,
): Promise<Done<Moved>> {
  const { tx, place } = context
  const open = unsettled(await holdUpsOf(tx, row.id))
  if (open.length > 0) {
    throw new DomainError(
      'wrong-state',
      `${open.length === 1 ? 'One thing holds' : `${open.length} things hold`} up the review: settle each, or waive it with a reason. The first is: ${open[0]!.what}`,
    )
  }
  const { auditHash } = await lockHead(tx, place.organisationId, place.projectId)
  const done = await moveRevision(context, row, 'close-review', note, { purpose, auditHead: auditHash })
  await requestReport(context, row.id, 'final')
  return done
}
