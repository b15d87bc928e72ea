import 'server-only'
import { DomainError } from '@/lib/errors'
import type { Tx } from '../db'

/** The signing round of a revision with its file as signed so far. */
export async function openRound(tx: Tx, revisionId: string) {
  const round = await tx.signatureRound.findFirst({ where: { revisionId, endedAt: null }, omit: { file: false } })
  if (!round) {
    throw new DomainError('wrong-state', 'The final report is still being rendered: sign when it is ready to be read.')
  }
  return round
}

export type OpenRound = Awaited<ReturnType<typeof openRound>>

/** The signer's listed certificate with the root above it. It counts only if it was on the list before the round began. */
export async function certificateFor(tx: Tx, round: OpenRound, userId: string) {
  const certificate = await tx.certificate.findFirst({
    where: { organisationId: round.organisationId, userId, revokedAt: null },
  })
  if (!certificate) {
    throw new DomainError('wrong-state', 'You have no signing certificate yet: make your signing key first.')
  }
  if (certificate.listedAt >= round.startedAt) {
    throw new DomainError(
      'wrong-state',
      'Your certificate was listed after this signing began, so it does not count here: take the revision back and close the review again.',
    )
  }
  const root = await tx.authority.findUniqueOrThrow({ where: { organisationId: round.organisationId } })
  return { certificate, chain: [root.certificate] }
}
