import 'server-only'
import { DomainError } from '@/lib/errors'
import type { WriteContext } from '../context'
import type { Done } from '../perform'
import { type Moved, moveRevision } from './move'
import { type RevisionWithSubject, withSubject } from './subject'

/** Issues the revision whose file all three have signed, and supersedes the one issued before. */
export async function issue(context: WriteContext, row: RevisionWithSubject, note: string): Promise<Done<Moved>> {
  const { tx, place, at } = context
  const { organisationId } = place
  const round = await tx.signatureRound.findFirst({ where: { revisionId: row.id, endedAt: null } })
  if (!round?.completedAt) throw new DomainError('wrong-state', 'The report is not signed by all three yet.')
  const before = await tx.revision.findFirst({ where: { studyId: row.studyId, state: 'issued' }, ...withSubject })
  const superseded = before
    ? await moveRevision(context, before, 'supersede', `Superseded by revision ${row.number}.`)
    : null
  const issued = await moveRevision(context, row, 'issue', note)
  await tx.registerEntry.create({
    data: { organisationId, kind: 'report', digest: round.sha256, subjectId: row.id, at },
  })
  return { answer: issued.answer, events: [...(superseded?.events ?? []), ...issued.events] }
}
