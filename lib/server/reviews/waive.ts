import 'server-only'
import type * as z from 'zod'
import { DomainError } from '@/lib/errors'
import type { ReportWaiver } from '@/lib/report/report-input'
import type { WriteContext } from '../context'
import type { Tx } from '../db'
import type { Done } from '../perform'
import { holdUpsOf } from './hold-ups'
import type { newWaiver } from './schema'

/** Puts down that a revision may go out in spite of a failed check or an unsettled comment, and why. */
export async function waiveHoldUp(
  { tx, actor, place: { organisationId }, at }: WriteContext,
  { revisionId, kind, subjectId, reason }: z.output<typeof newWaiver>,
): Promise<Done<{ subjectId: string }>> {
  const held = (await holdUpsOf(tx, revisionId)).find((one) => one.kind === kind && one.subjectId === subjectId)
  if (!held) throw new DomainError('wrong-state', 'This no longer holds up the review: reload the page.')
  if (held.waived) throw new DomainError('wrong-state', `${held.waived.person} has waived this already.`)
  const by = { personId: actor.userId, personName: actor.name, at }
  await tx.waiver.create({ data: { organisationId, revisionId, kind, subjectId, what: held.what, reason, ...by } })
  return {
    answer: { subjectId },
    events: [
      {
        action: 'hold-up-waived',
        subject: { kind, id: subjectId },
        payload: { revisionId, what: held.what, reason },
      },
    ],
  }
}

/** The waivers of a revision as its report prints them. */
export async function waiversOf(tx: Tx, revisionId: string): Promise<ReportWaiver[]> {
  const rows = await tx.waiver.findMany({ where: { revisionId }, orderBy: [{ at: 'asc' }, { subjectId: 'asc' }] })
  return rows.map(({ what, reason, personName, at }) => ({
    limitId: null,
    what,
    reason,
    who: personName,
    at: at.toISOString(),
  }))
}
