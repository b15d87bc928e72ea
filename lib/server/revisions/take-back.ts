import 'server-only'
import type { WriteContext } from '../context'
import type { Done } from '../perform'
import { type Moved, moveRevision } from './move'
import type { RevisionWithSubject } from './subject'

/** Takes a revision back to draft; the signing round, if one has begun, ends with the reason and keeps its file. */
export async function takeBack(context: WriteContext, row: RevisionWithSubject, reason: string): Promise<Done<Moved>> {
  const { tx, at } = context
  await tx.preparedSignature.deleteMany({ where: { round: { revisionId: row.id } } })
  await tx.signatureRound.updateMany({
    where: { revisionId: row.id, endedAt: null },
    data: { endedAt: at, endedReason: reason },
  })
  return moveRevision(context, row, 'back-to-draft', reason)
}
