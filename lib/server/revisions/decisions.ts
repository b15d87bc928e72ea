import 'server-only'
import type { RevisionMove } from '@/lib/study/states'
import type { Actor } from '../actor'
import type { Tx } from '../db'
import { newId } from '../identity'

/** Puts down who decided what about a revision, in their own words. */
export async function addDecision(
  tx: Tx,
  decision: {
    organisationId: string
    revisionId: string
    move: RevisionMove | 'freeze'
    actor: Actor
    note: string
    at: Date
  },
): Promise<void> {
  const { organisationId, revisionId, move, actor, note, at } = decision
  await tx.decision.create({
    data: { organisationId, id: newId(), revisionId, move, personId: actor.userId, personName: actor.name, note, at },
  })
}
