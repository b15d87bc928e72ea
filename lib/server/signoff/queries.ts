import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { toBase64 } from '../base64'
import { idInput } from '../identity'
import { query } from '../read'
import { makeChallenge } from './challenge'

/** One line of the organisation's append-only list. */
export interface ListedCertificateLine {
  fingerprint: string
  subject: { name: string; email: string }
  serialNumber: string
  notBefore: string
  notAfter: string
  listedAt: string
  revokedAt: string | null
  revokedReason: string | null
  /** DER, base64. */
  certificate: string
}

const organisationScope = ({ organisationId }: { organisationId?: string | undefined }) => ({
  kind: 'organisation' as const,
  id: organisationId,
})
const input = z.object({ organisationId: idInput.optional() })
const everyMember = () => ({ allowed: true as const })

/** Every certificate that the organisation has listed, oldest first; members see it. */
export const listedCertificates = query({
  input,
  scope: organisationScope,
  load: async () => undefined,
  may: everyMember,
  run: async ({ tx, place }): Promise<ListedCertificateLine[]> => {
    const rows = await tx.certificate.findMany({
      where: { organisationId: place.organisationId },
      orderBy: { listedAt: 'asc' },
    })
    return rows.map((row) => ({
      fingerprint: row.fingerprint,
      subject: { name: row.subjectName, email: row.subjectEmail },
      serialNumber: row.serialNumber,
      notBefore: row.notBefore.toISOString(),
      notAfter: row.notAfter.toISOString(),
      listedAt: row.listedAt.toISOString(),
      revokedAt: row.revokedAt?.toISOString() ?? null,
      revokedReason: row.revokedReason,
      certificate: toBase64(row.certificate),
    }))
  },
})

export interface AuthorityCertificate {
  organisation: string
  fingerprint: string
  /** DER, base64. */
  certificate: string
}

/** The root certificate of the organisation, for readers who want to trust its signatures in their own viewer. */
export const authorityCertificate = query({
  input,
  scope: organisationScope,
  load: async () => undefined,
  may: everyMember,
  run: async ({ tx, place: { organisationId } }): Promise<AuthorityCertificate> => {
    const authority = await tx.authority.findUnique({
      where: { organisationId },
      include: { organisation: { select: { name: true } } },
    })
    if (!authority) throw new DomainError('not-found', 'This organisation has no certificate authority yet.')
    const { fingerprint, certificate, organisation } = authority
    return { organisation: organisation.name, fingerprint, certificate: toBase64(certificate) }
  },
})

/** What a browser needs to make a signing key and prove that it holds it. */
export interface SigningChallenge {
  organisationId: string
  /** base64 */
  challenge: string
  subject: { name: string; email: string; organisation: string }
}

/** A challenge for the person's new signing key; it runs out after 15 minutes. */
export const signingChallenge = query({
  input,
  scope: organisationScope,
  load: async () => undefined,
  may: everyMember,
  run: async ({ tx, actor, at, place: { organisationId } }): Promise<SigningChallenge> => {
    const { name: organisation } = await tx.organisation.findUniqueOrThrow({ where: { id: organisationId } })
    return {
      organisationId,
      challenge: toBase64(makeChallenge(actor.userId, at)),
      subject: { name: actor.name, email: actor.email, organisation },
    }
  },
})
