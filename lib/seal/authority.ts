import { sha256 } from './sha256'
import { x509 } from './x509'

/** An organisation's certificate authority: its certificate and the key that issues leaves. */
export interface Authority {
  /** The self-signed root, DER. */
  readonly certificate: Uint8Array
  readonly key: CryptoKey
}

/** The one algorithm of all keys and signatures here. */
export const signingAlgorithm = { name: 'ECDSA', namedCurve: 'P-256', hash: 'SHA-256' } as const

/**
 * Makes an organisation's root certificate (P-256) and its key. The path length of 0 lets it issue signers' certificates and nothing
 * below them. The key can be exported, so that it can be wrapped and stored; wrap it at once.
 * Source: RFC 5280, sections 4.2.1.3 (key usage) and 4.2.1.9 (basic constraints).
 */
export async function makeAuthority(organisation: string, notBefore: Date, notAfter: Date): Promise<Authority> {
  const keys = await crypto.subtle.generateKey(signingAlgorithm, true, ['sign', 'verify'])
  const spki = new Uint8Array(await crypto.subtle.exportKey('spki', keys.publicKey))
  const root = await x509.X509CertificateGenerator.createSelfSigned({
    // A serial number of its own key: 16 octets, positive, and never that of another root.
    serialNumber: `4f${Buffer.from(sha256(spki).subarray(0, 15)).toString('hex')}`,
    name: [{ O: [organisation] }, { CN: [`${organisation}: sign-off authority`.slice(0, 64)] }],
    notBefore,
    notAfter,
    keys,
    signingAlgorithm,
    extensions: [
      new x509.BasicConstraintsExtension(true, 0, true),
      new x509.KeyUsagesExtension(x509.KeyUsageFlags.keyCertSign | x509.KeyUsageFlags.cRLSign, true),
      await x509.SubjectKeyIdentifierExtension.create(keys.publicKey),
    ],
  })
  return { certificate: new Uint8Array(root.rawData), key: keys.privateKey }
}
