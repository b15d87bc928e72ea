import * as asn1js from 'asn1js'
import * as pkijs from 'pkijs'
import { readCertificate } from './certificate'
import { ecdsaFromDer, ecdsaToDer } from './ecdsa-value'
import { signedAttributes } from './signed-attributes'

const sha256Algorithm = '2.16.840.1.101.3.4.2.1'
const ecdsaWithSha256 = '1.2.840.10045.4.3.2'
const data = '1.2.840.113549.1.7.1'
const signedData = '1.2.840.113549.1.7.2'
const messageDigest = '1.2.840.113549.1.9.4'

/** What a detached signature consists of; everything else in its encoding follows from these. */
export interface CmsParts {
  /** SHA-256 of the signed bytes. */
  readonly documentDigest: Uint8Array
  /** The signer's certificate, DER. */
  readonly certificate: Uint8Array
  /** The certificates above it, DER. */
  readonly chain: readonly Uint8Array[]
  /** r then s, 64 octets. */
  readonly value: Uint8Array
}

/** Encodes a detached CMS signature with one signer, DER. Equal parts give equal bytes. Source: RFC 5652, section 5; RFC 5753, section 2. */
export function encodeCms({ documentDigest, certificate, chain, value }: CmsParts): Uint8Array {
  const [leaf, ...others] = [certificate, ...chain].map(toPkijs)
  const signer = new pkijs.SignerInfo({
    version: 1,
    sid: new pkijs.IssuerAndSerialNumber({ issuer: leaf!.issuer, serialNumber: leaf!.serialNumber }),
    digestAlgorithm: new pkijs.AlgorithmIdentifier({ algorithmId: sha256Algorithm }),
    signatureAlgorithm: new pkijs.AlgorithmIdentifier({ algorithmId: ecdsaWithSha256 }),
    signature: new asn1js.OctetString({ valueHex: ecdsaToDer(value) }),
    signedAttrs: new pkijs.SignedAndUnsignedAttributes({
      type: 0,
      attributes: signedAttributes(documentDigest, certificate),
    }),
  })
  const content = new pkijs.SignedData({
    version: 1,
    digestAlgorithms: [signer.digestAlgorithm],
    encapContentInfo: new pkijs.EncapsulatedContentInfo({ eContentType: data }),
    signerInfos: [signer],
    certificates: [leaf!, ...others],
  })
  return new Uint8Array(
    new pkijs.ContentInfo({ contentType: signedData, content: content.toSchema(true) }).toSchema().toBER(),
  )
}

/**
 * Takes a signature apart again. Undefined unless encoding the parts gives the very same octets: then no octet of it can differ from what
 * was written here without a part differing, and a part that differs fails its own check.
 */
export function decodeCms(der: Uint8Array): CmsParts | undefined {
  try {
    const parts = partsOf(der)
    if (parts) readCertificate(parts.certificate)
    return parts && Buffer.compare(encodeCms(parts), der) === 0 ? parts : undefined
  } catch {
    // The library throws whatever its schema trips over; any of it means the same: not a signature of ours, or not by a certificate.
    return undefined
  }
}

function partsOf(der: Uint8Array): CmsParts | undefined {
  const content = new pkijs.SignedData({ schema: pkijs.ContentInfo.fromBER(new Uint8Array(der)).content })
  const [signer] = content.signerInfos
  const digest = signer?.signedAttrs?.attributes.find((attribute) => attribute.type === messageDigest)?.values[0]
  const value = signer && ecdsaFromDer(signer.signature.valueBlock.valueHexView)
  const [certificate, ...chain] = (content.certificates ?? []).flatMap((item) =>
    item instanceof pkijs.Certificate ? [new Uint8Array(item.toSchema(false).toBER())] : [],
  )
  if (!(digest instanceof asn1js.OctetString) || !value || !certificate) return undefined
  return { documentDigest: new Uint8Array(digest.valueBlock.valueHexView), certificate, chain, value }
}

function toPkijs(der: Uint8Array): pkijs.Certificate {
  return pkijs.Certificate.fromBER(new Uint8Array(der))
}
