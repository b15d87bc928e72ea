import { DomainError } from '@/lib/errors'
import { sha256Hex } from './sha256'
import type { CertificateSubject } from './verdict'
import { x509 } from './x509'

/** The parts of a certificate that sign-off and its check need. */
export interface Certificate {
  readonly der: Uint8Array
  readonly subject: CertificateSubject
  /** SHA-256 of the DER bytes, 64 lower-case hexadecimal digits. */
  readonly fingerprint: string
  readonly serialNumber: string
  readonly notBefore: Date
  readonly notAfter: Date
  /** Subject public key info, DER. */
  readonly spki: Uint8Array
}

/** Reads a DER certificate; anything else, and bytes after it, are refused as `invalid`. */
export function readCertificate(der: Uint8Array): Certificate {
  return reading(der, (parsed) => ({
    der,
    subject: subjectOf(parsed),
    fingerprint: sha256Hex(der),
    serialNumber: parsed.serialNumber,
    notBefore: parsed.notBefore,
    notAfter: parsed.notAfter,
    spki: new Uint8Array(parsed.publicKey.rawData),
  }))
}

/** The library's own view of a DER certificate; refused as `readCertificate` refuses. */
export function parseCertificate(der: Uint8Array): x509.X509Certificate {
  return reading(der, (parsed) => parsed)
}

/** The library reads some parts late and throws what it meets: all of it means that the certificate is none. */
function reading<T>(der: Uint8Array, use: (parsed: x509.X509Certificate) => T): T {
  try {
    const parsed = new x509.X509Certificate(new Uint8Array(der))
    // The parser accepts looser encodings, and bytes behind the end; a fingerprint must name one reading only.
    if (Buffer.compare(Buffer.from(parsed.rawData), der) === 0) return use(parsed)
  } catch {
    // refused below
  }
  throw new DomainError('invalid', 'This is not a certificate in DER form: choose the certificate file itself.')
}

function subjectOf(certificate: x509.X509Certificate): CertificateSubject {
  const field = (id: string) => certificate.subjectName.getField(id)[0] ?? ''
  const names = certificate.getExtension(x509.SubjectAlternativeNameExtension)?.names.items ?? []
  const email = names.find((name) => name.type === 'email')?.value ?? ''
  return { name: field('CN'), email, organisation: field('O') }
}
