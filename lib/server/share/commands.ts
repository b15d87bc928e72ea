import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { idInput, newId } from '../identity'
import { linkDigest, makeLinkToken } from '../link-token'
import { hashPassword } from '../people/password'
import { command } from '../perform'
import { ofRevision } from '../revisions/schema'
import { loadRevision } from '../revisions/subject'

const day = 86_400_000
const revisionScope = ({ revisionId }: { revisionId: string }) => ({ kind: 'revision' as const, id: revisionId })

/** Makes a link by which one recipient downloads an issued report; the answer holds its secret, which is shown once and never kept. */
export const shareReport = command({
  input: ofRevision.extend({
    recipient: z.string().trim().min(1, 'Say for whom it is.').max(160, 'Keep the recipient within 160 characters.'),
    days: z.int('Give whole days.').min(1, 'Give a day or more.').max(365, 'Keep it within a year.'),
    mostDownloads: z
      .int('Give a whole number.')
      .min(1, 'Allow a download or more.')
      .max(1000, 'Keep it within 1000.')
      .nullable(),
    passphrase: z
      .string()
      .min(8, 'Use 8 characters or more.')
      .max(128, 'Use 128 characters or fewer.')
      .nullable()
      .default(null),
  }),
  scope: revisionScope,
  load: async ({ tx }, { revisionId }) => loadRevision(tx, revisionId),
  may: (actor, { subject }) => can(actor, 'share-report', subject),
  run: async ({ tx, actor, place: { organisationId }, at }, input) => {
    const { revisionId, recipient, days, mostDownloads, passphrase } = input
    const token = makeLinkToken()
    const id = newId()
    const expiresAt = new Date(at.getTime() + days * day)
    await tx.shareLink.create({
      data: {
        organisationId,
        id,
        revisionId,
        tokenHash: linkDigest(token),
        recipient,
        passphraseHash: passphrase === null ? null : await hashPassword(passphrase),
        expiresAt,
        mostDownloads,
        createdById: actor.userId,
        createdByName: actor.name,
        createdAt: at,
      },
    })
    const payload = { revisionId, recipient, expiresAt, mostDownloads, passphrase: passphrase !== null }
    return {
      answer: { shareId: id, token, expiresAt: expiresAt.toISOString() },
      events: [{ action: 'report-shared', subject: { kind: 'share', id }, payload }],
    }
  },
})

/** Ends a link at once; what was downloaded stays with whoever has it. */
export const endShare = command({
  input: ofRevision.extend({ shareId: idInput }),
  scope: revisionScope,
  load: async ({ tx }, { revisionId, shareId }) => ({
    ...(await loadRevision(tx, revisionId)),
    link: await tx.shareLink.findFirst({ where: { id: shareId, revisionId, endedAt: null } }),
  }),
  may: (actor, { subject }) => can(actor, 'end-share', subject),
  run: async ({ tx, actor, place: { organisationId }, at }, { shareId: id }, { link }) => {
    if (!link) throw new DomainError('not-found', 'This link has ended already.')
    const where = { organisationId_id: { organisationId, id } }
    await tx.shareLink.update({ where, data: { endedAt: at, endedByName: actor.name } })
    return {
      answer: { shareId: id },
      events: [{ action: 'share-ended', subject: { kind: 'share', id }, payload: { recipient: link.recipient } }],
    }
  },
})
