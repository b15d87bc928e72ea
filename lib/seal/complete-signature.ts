import { DomainError } from '@/lib/errors'
import { readCertificate } from './certificate'
import { encodeCms } from './cms'
import { verifiesP256 } from './key-proof'
import { digestOfRange, type PreparedSignature } from './prepare-signature'
import { contentsLength } from './signature-dictionary'
import { attributesToSign } from './signed-attributes'

/**
 * Second step of signing: puts the value (r then s, 64 octets) into the waiting file. Nothing is taken on trust: the octets to sign are
 * made again from the file, and a value that is not their signature by the certificate's key is refused as `invalid`.
 */
export function completeSignature(prepared: PreparedSignature, value: Uint8Array): Uint8Array {
  const { pdf, range, certificate, chain } = prepared
  const documentDigest = digestOfRange(pdf, range)
  const { spki, subject } = readCertificate(certificate)
  if (!verifiesP256(spki, attributesToSign(documentDigest, certificate), value)) {
    throw new DomainError(
      'invalid',
      `The signature was not made with the key of ${subject.name}'s certificate: open the right signing key.`,
    )
  }
  const cms = encodeCms({ documentDigest, certificate, chain, value })
  if (cms.length > contentsLength) throw new Error(`a signature of ${cms.length} octets does not fit`)
  const signed = new Uint8Array(pdf)
  signed.set(Buffer.from(Buffer.from(cms).toString('hex'), 'latin1'), range[1] + 1)
  return signed
}
