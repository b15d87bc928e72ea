import 'server-only'
import { createHash, randomBytes } from 'node:crypto'
import { prepareSignature } from '@/lib/seal/prepare-signature'
import type { SignOffRole } from '@/lib/study/states'
import { toBase64 } from '../base64'
import type { WriteContext } from '../context'
import type { Done } from '../perform'
import type { RevisionWithSubject } from '../revisions/subject'
import { orderOf } from './order-of'
import { certificateFor, openRound } from './round-of'

/** What the signer's browser gets: the octets to sign with SHA-256 and P-256, and the token for the second step. */
export interface BegunSignature {
  /** base64 */
  attributes: string
  token: string
  /** Fingerprint of the certificate whose key must sign. */
  certificate: string
  expiresAt: string
}

const lifetime = 10 * 60_000

export const tokenHash = (token: string): string => createHash('sha256').update(token).digest('hex')

export async function beginSignature(
  { tx, actor, at, place }: WriteContext,
  row: RevisionWithSubject,
  role: SignOffRole,
): Promise<Done<BegunSignature>> {
  const { organisationId } = place
  const round = await openRound(tx, row.id)
  const { certificate, chain } = await certificateFor(tx, round, actor.userId)
  // the file states whole seconds
  const signedAt = new Date(Math.floor(at.getTime() / 1000) * 1000)
  const { attributes } = prepareSignature(round.file, orderOf(role, certificate.certificate, chain, signedAt))
  const token = randomBytes(32).toString('base64url')
  const expiresAt = new Date(at.getTime() + lifetime)
  await tx.preparedSignature.deleteMany({ where: { roundId: round.id, role } })
  await tx.preparedSignature.create({
    data: {
      organisationId,
      token: tokenHash(token),
      roundId: round.id,
      role,
      userId: actor.userId,
      fingerprint: certificate.fingerprint,
      baseSha256: round.sha256,
      at: signedAt,
      expiresAt,
    },
  })
  return {
    answer: {
      attributes: toBase64(attributes),
      token,
      certificate: certificate.fingerprint,
      expiresAt: expiresAt.toISOString(),
    },
    // beginning changes nothing that others see
    events: [],
  }
}
