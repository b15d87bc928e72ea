import 'server-only'
import { randomBytes } from 'node:crypto'
import { DomainError } from '@/lib/errors'
import { readCertificate } from '@/lib/seal/certificate'
import { issueSigner } from '@/lib/seal/issue-signer'
import { unwrapKey } from '@/lib/seal/wrapped-key'
import type { WriteContext } from '../context'
import { env } from '../env'
import type { Done } from '../perform'
import { isOwnChallenge } from './challenge'

/** A new key with the proof that its owner holds it. */
export interface KeyToRegister {
  spki: Uint8Array
  challenge: Uint8Array
  proof: Uint8Array
}

export interface RegisteredCertificate {
  fingerprint: string
  listedAt: string
  notAfter: string
  subject: { name: string; email: string; organisation: string }
  /** The certificate, DER, base64. */
  certificate: string
}

/** Five years, so that a certificate outlives the usual project. */
const years = 5

/** Issues and lists a certificate for the person's own key. */
export async function issueCertificate(
  context: WriteContext,
  key: KeyToRegister,
): Promise<Done<RegisteredCertificate>> {
  const { tx, actor, at, place } = context
  const { organisationId } = place
  if (!isOwnChallenge(key.challenge, actor.userId, at)) {
    throw new DomainError('invalid', 'This took too long: load the page again and make the signing key once more.')
  }
  if (await tx.certificate.findFirst({ where: { organisationId, userId: actor.userId, revokedAt: null } })) {
    throw new DomainError(
      'conflict',
      'You have a signing certificate in this organisation already. Replacing it is not possible yet: use the key file that belongs to it.',
    )
  }
  const organisation = await tx.organisation.findUniqueOrThrow({ where: { id: organisationId } })
  const kept = await tx.authority.findUnique({ where: { organisationId }, omit: { wrappedKey: false } })
  if (!kept) throw new Error(`the organisation ${organisationId} has no certificate authority`)
  const authority = await unwrapKey(kept.wrappedKey, kept.certificate, env().CA_WRAP_SECRET)
  const root = readCertificate(kept.certificate)
  const wanted = new Date(at)
  wanted.setUTCFullYear(wanted.getUTCFullYear() + years)
  const der = await issueSigner(
    authority,
    { name: actor.name, email: actor.email, organisation: organisation.name },
    { spki: key.spki, challenge: key.challenge, signature: key.proof },
    serialNumber(),
    { notBefore: startOfValidity(at), notAfter: wanted < root.notAfter ? wanted : root.notAfter },
  )
  const certificate = readCertificate(der)
  const { fingerprint, subject, notBefore, notAfter } = certificate
  await tx.certificate.create({
    data: {
      organisationId,
      fingerprint,
      userId: actor.userId,
      serialNumber: certificate.serialNumber,
      certificate: new Uint8Array(der),
      subjectName: subject.name,
      subjectEmail: subject.email,
      notBefore,
      notAfter,
      listedAt: at,
    },
  })
  await tx.registerEntry.create({
    data: { organisationId, kind: 'certificate', digest: fingerprint, subjectId: fingerprint, at },
  })
  return {
    answer: {
      fingerprint,
      listedAt: at.toISOString(),
      notAfter: notAfter.toISOString(),
      subject,
      certificate: Buffer.from(der).toString('base64'),
    },
    events: [
      {
        action: 'certificate-listed',
        subject: { kind: 'certificate', id: fingerprint },
        payload: { person: actor.userId, notAfter: notAfter.toISOString() },
      },
    ],
  }
}

/** Certificates count in whole seconds; a signature made at once must not lie before its certificate. */
const startOfValidity = (at: Date): Date => new Date(Math.floor(at.getTime() / 1000) * 1000)

/** 16 random octets, positive and without a leading zero. */
function serialNumber(): string {
  const octets = randomBytes(16)
  octets[0] = (octets[0]! & 0x3f) | 0x40
  return octets.toString('hex')
}
