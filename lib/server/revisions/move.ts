import 'server-only'
import { DomainError } from '@/lib/errors'
import { nextState, type RevisionMove, type RevisionState } from '@/lib/study/states'
import type { Prisma } from '@/prisma/generated/client'
import type { WriteContext } from '../context'
import type { Done } from '../perform'
import { addDecision } from './decisions'
import { type RevisionWithSubject, revisionState } from './subject'

export interface Moved {
  revisionId: string
  state: RevisionState
}

/** What besides the state a move writes. */
function alongside(move: RevisionMove, personId: string, at: Date, note: string): Prisma.RevisionUncheckedUpdateInput {
  switch (move) {
    // whatever was decided on an earlier round does not count in the next
    case 'send-for-check':
      return { checkedById: null, reviewAcceptedById: null }
    case 'accept-check':
      return { checkedById: personId }
    case 'accept-review':
      return { reviewAcceptedById: personId }
    case 'close-review':
      return { closedAt: at }
    case 'reject-check':
    case 'reject-review':
    case 'back-to-draft':
      return { checkedById: null, reviewAcceptedById: null, closedAt: null, purpose: null, auditHead: null }
    case 'issue':
      return { issuedAt: at }
    case 'supersede':
      return { supersededAt: at }
    case 'withdraw':
      return { withdrawnAt: at, withdrawnReason: note }
  }
}

/** Moves a revision on: state, what belongs to it, the decision, the event. */
export async function moveRevision(
  { tx, place, actor, at }: WriteContext,
  row: Pick<RevisionWithSubject, 'id' | 'state' | 'number' | 'studyId'>,
  move: RevisionMove,
  note: string,
  further: Prisma.RevisionUncheckedUpdateInput = {},
): Promise<Done<Moved>> {
  const state = nextState(revisionState(row.state), move)
  if (!state) throw new DomainError('wrong-state', 'The revision has moved on meanwhile: reload the page.')
  if (move === 'send-for-check') await refuseOlderAttempt(tx, row)
  const { organisationId } = place
  await tx.revision.update({
    where: { organisationId_id: { organisationId, id: row.id } },
    data: { state, ...alongside(move, actor.userId, at, note), ...further },
  })
  await addDecision(tx, { organisationId, revisionId: row.id, move, actor, note, at })
  return {
    answer: { revisionId: row.id, state },
    events: [
      {
        action: `revision-${move}`,
        subject: { kind: 'revision', id: row.id },
        payload: { number: row.number, state, note },
      },
    ],
  }
}

/** Only the newest frozen copy goes on; and one revision of a study at a time. */
async function refuseOlderAttempt(
  tx: WriteContext['tx'],
  row: Pick<RevisionWithSubject, 'id' | 'studyId'>,
): Promise<void> {
  const newest = await tx.revision.findFirst({
    where: { studyId: row.studyId },
    orderBy: [{ number: 'desc' }, { attempt: 'desc' }],
    select: { id: true, number: true },
  })
  if (newest && newest.id !== row.id) {
    throw new DomainError('wrong-state', `Revision ${newest.number} was frozen after this one: send that one instead.`)
  }
}
