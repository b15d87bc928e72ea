import { type Authority, signingAlgorithm } from './authority'
import { parseCertificate } from './certificate'
import { x509 } from './x509'

/** One revoked certificate by its serial number (hexadecimal) and the instant from which it no longer counts. */
export interface Revocation {
  readonly serialNumber: string
  readonly revokedAt: Date
}

/** Makes the authority's revocation list, DER, for readers that check certificates by themselves. Source: RFC 5280, section 5. */
export async function makeRevocationList(
  authority: Authority,
  revocations: readonly Revocation[],
  listNumber: number,
  thisUpdate: Date,
  nextUpdate: Date,
): Promise<Uint8Array> {
  const root = parseCertificate(authority.certificate)
  const list = await x509.X509CrlGenerator.create({
    issuer: root.subjectName,
    thisUpdate,
    nextUpdate,
    entries: revocations.map(({ serialNumber, revokedAt }) => ({ serialNumber, revocationDate: revokedAt })),
    extensions: [
      await x509.AuthorityKeyIdentifierExtension.create(root.publicKey),
      // CRL number (2.5.29.20), an INTEGER that grows with each list.
      new x509.Extension('2.5.29.20', false, derInteger(listNumber)),
    ],
    signingAlgorithm,
    signingKey: authority.key,
  })
  return new Uint8Array(list.rawData)
}

function derInteger(value: number): Uint8Array<ArrayBuffer> {
  if (!Number.isSafeInteger(value) || value < 1) throw new RangeError(`revocation list number ${value}`)
  const hex = value.toString(16)
  const octets = Buffer.from(hex.length % 2 ? `0${hex}` : hex, 'hex')
  const sign = octets[0]! & 0x80 ? [0] : []
  return new Uint8Array([2, octets.length + sign.length, ...sign, ...octets])
}
