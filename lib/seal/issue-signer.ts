import { DomainError, type FieldIssue } from '@/lib/errors'
import { type Authority, signingAlgorithm } from './authority'
import { parseCertificate } from './certificate'
import { holdsKey, type KeyProof } from './key-proof'
import type { CertificateSubject } from './verdict'
import { x509 } from './x509'

/** From when to when a certificate may be used to sign. */
export interface Validity {
  readonly notBefore: Date
  readonly notAfter: Date
}

/**
 * Issues one person's certificate: a leaf that may sign documents and nothing else. The serial number is positive, at most 20 octets, in
 * hexadecimal, and never used twice. Refused as `invalid` when the proof of possession fails, a name cannot stand in a certificate, or the
 * validity reaches beyond the authority's own. Source: RFC 5280, section 4.2; RFC 9336 is not used, since readers do not know it yet.
 */
export async function issueSigner(
  authority: Authority,
  person: CertificateSubject,
  proof: KeyProof,
  serialNumber: string,
  validity: Validity,
): Promise<Uint8Array> {
  const root = parseCertificate(authority.certificate)
  if (!holdsKey(proof)) {
    throw new DomainError(
      'invalid',
      'The proof that you hold this signing key does not fit the key: make the key again in this browser.',
    )
  }
  if (!/^(?!00)[0-7][0-9a-f](?:[0-9a-f]{2}){0,19}$/.test(serialNumber))
    throw new RangeError(`serial number ${serialNumber}`)
  const issues = [...nameIssues(person), ...validityIssues(validity, root)]
  if (issues.length > 0)
    throw new DomainError('invalid', 'The certificate cannot be issued: correct the marked details.', issues)

  const publicKey = new x509.PublicKey(new Uint8Array(proof.spki))
  const leaf = await x509.X509CertificateGenerator.create({
    serialNumber,
    subject: [{ O: [person.organisation] }, { CN: [person.name] }],
    issuer: root.subjectName,
    ...validity,
    publicKey,
    signingKey: authority.key,
    signingAlgorithm,
    extensions: [
      new x509.BasicConstraintsExtension(false, undefined, true),
      new x509.KeyUsagesExtension(x509.KeyUsageFlags.digitalSignature | x509.KeyUsageFlags.nonRepudiation, true),
      new x509.ExtendedKeyUsageExtension([x509.ExtendedKeyUsage.emailProtection]),
      new x509.SubjectAlternativeNameExtension([{ type: 'email', value: person.email }]),
      await x509.SubjectKeyIdentifierExtension.create(publicKey),
      await x509.AuthorityKeyIdentifierExtension.create(root.publicKey),
    ],
  })
  return new Uint8Array(leaf.rawData)
}

function nameIssues(person: CertificateSubject): FieldIssue[] {
  const issues: FieldIssue[] = []
  for (const field of ['name', 'organisation'] as const) {
    // 64 characters is the upper bound of X.520 for both.
    if (!/^[^\p{C}]{1,64}$/u.test(person[field]) || person[field].trim() !== person[field]) {
      issues.push({ path: [field], message: 'Give 1 to 64 printable characters, without a space at either end.' })
    }
  }
  if (!/^[\x21-\x3f\x41-\x7e]{1,64}@[\x21-\x3f\x41-\x7e]{1,190}$/.test(person.email)) {
    issues.push({ path: ['email'], message: 'Give one e-mail address in plain letters, such as name@example.org.' })
  }
  return issues
}

function validityIssues({ notBefore, notAfter }: Validity, root: x509.X509Certificate): FieldIssue[] {
  if (notBefore < notAfter && notBefore >= root.notBefore && notAfter <= root.notAfter) return []
  return [
    {
      path: ['notAfter'],
      message: 'The certificate must lie within the validity of the certificate authority: renew the authority.',
    },
  ]
}
