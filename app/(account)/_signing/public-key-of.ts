import { X509Certificate } from 'node:crypto'

/** The public key (subject public key info) of a DER certificate, both base64: by it a browser finds the key that belongs to it. For server files. */
export function publicKeyOf(certificate: string): string {
  const { publicKey } = new X509Certificate(Buffer.from(certificate, 'base64'))
  return publicKey.export({ type: 'spki', format: 'der' }).toString('base64')
}
