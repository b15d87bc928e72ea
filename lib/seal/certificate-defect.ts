import { X509Certificate } from 'node:crypto'
import { parseCertificate } from './certificate'
import { x509 } from './x509'

const { KeyUsageFlags } = x509

/**
 * What is wrong with a signer's certificate as such, in words that complete a sentence; undefined if nothing. It must be a leaf for signing
 * documents, and its one issuer, carried along, must be an authority that signed both it and itself. Whether that authority counts is
 * another question: certificates are trusted one by one. Source: RFC 5280, section 6.1.
 */
export function certificateDefect(certificate: Uint8Array, chain: readonly Uint8Array[]): string | undefined {
  try {
    return findDefect(certificate, chain)
  } catch {
    // A certificate made to trip a parser is no certificate.
    return 'it cannot be read'
  }
}

function findDefect(certificate: Uint8Array, chain: readonly Uint8Array[]): string | undefined {
  const leaf = parseCertificate(certificate)
  if (leaf.getExtension(x509.BasicConstraintsExtension)?.ca !== false) return 'it is not marked as a signer’s'
  const usage = leaf.getExtension(x509.KeyUsagesExtension)?.usages ?? 0
  const wanted = KeyUsageFlags.digitalSignature | KeyUsageFlags.nonRepudiation
  if ((usage & wanted) !== wanted) return 'it is not meant for signing documents'
  const purposes = leaf.getExtension(x509.ExtendedKeyUsageExtension)?.usages ?? []
  if (!purposes.includes(x509.ExtendedKeyUsage.emailProtection)) return 'it is not meant for signing documents'
  const [issuer, ...more] = chain
  if (!issuer || more.length > 0) return 'the authority that issued it is not there'
  return issuerDefect(new X509Certificate(certificate), new X509Certificate(issuer))
}

function issuerDefect(leaf: X509Certificate, issuer: X509Certificate): string | undefined {
  if (!issuer.ca || !leaf.checkIssued(issuer)) return 'its authority is another one than it names'
  if (!leaf.verify(issuer.publicKey) || !issuer.verify(issuer.publicKey)) return 'its authority did not sign it'
  return undefined
}
