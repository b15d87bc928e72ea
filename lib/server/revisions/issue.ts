import 'server-only'
import { DomainError } from '@/lib/errors'
import type { WriteContext } from '../context'
import type { Done } from '../perform'
import { type Moved, moveRevision } from './move'
import { type RevisionWithSubject, withSubject } from './subject'

/** Issues the revision whose file all three have signed, and supersedes the one issued before. */
export async function issue(context: WriteContext, row: RevisionWithSubject, note: string): Promise<Done<Moved>> {
  const { tx } = context
  const round = await tx.signatureRound.findFirst({ where: { revisionId: row.id, endedAt: null } })
  if (!round?.completedAt) throw new DomainError('wrong-state', 'The report is not signed by all three yet.')
  const before = await tx.revision.findFirst({ where: { studyId: row.studyId, state: 'issued' }, ...withSubject })
  const superseded = before
    ? await moveRevision(context, before, 'supersede', `Superseded by revision ${row.number}.`)
    : null
  const issued = await moveRevision(context, row, 'issue', note)
  await register(context, row.id, round.sha256)
  return { answer: issued.answer, events: [...(superseded?.events ?? []), ...issued.events] }
}

/** Withdraws a revision. A file that was signed by all and never issued is registered too, so that its standing can be told. */
export async function withdraw(context: WriteContext, row: RevisionWithSubject, reason: string): Promise<Done<Moved>> {
  const round = await context.tx.signatureRound.findFirst({ where: { revisionId: row.id, endedAt: null } })
  if (round?.completedAt && row.state !== 'issued') await register(context, row.id, round.sha256)
  return moveRevision(context, row, 'withdraw', reason)
}

async function register(
  { tx, place: { organisationId }, at }: WriteContext,
  revisionId: string,
  sha256: string,
): Promise<void> {
  await tx.registerEntry.create({ data: { organisationId, kind: 'report', digest: sha256, subjectId: revisionId, at } })
}
