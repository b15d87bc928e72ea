import * as asn1js from 'asn1js'
import { Attribute } from 'pkijs'
import { sha256 } from './sha256'

const contentType = '1.2.840.113549.1.9.3'
const messageDigest = '1.2.840.113549.1.9.4'
const signingCertificateV2 = '1.2.840.113549.1.9.16.2.47'
const data = '1.2.840.113549.1.7.1'

/**
 * The attributes that a signature covers: the kind of content, the SHA-256 of the document's bytes, and the SHA-256 of the signer's
 * certificate, which ties the signature to that certificate and no look-alike. No signing time: in a PDF it stands in the signature's own
 * dictionary. In DER order. Source: ETSI EN 319 122-1, section 5.2.2.3 (signing certificate); RFC 5652, section 5.3.
 */
export function signedAttributes(documentDigest: Uint8Array, certificate: Uint8Array): Attribute[] {
  const certificateDigest = new asn1js.OctetString({ valueHex: sha256(certificate) })
  const sequence = (value: asn1js.BaseBlock) => new asn1js.Sequence({ value: [value] })
  return [
    new Attribute({ type: contentType, values: [new asn1js.ObjectIdentifier({ value: data })] }),
    new Attribute({ type: messageDigest, values: [new asn1js.OctetString({ valueHex: documentDigest })] }),
    // SigningCertificateV2 { certs { ESSCertIDv2 { certHash } } }, the hash being SHA-256 by default.
    new Attribute({ type: signingCertificateV2, values: [sequence(sequence(sequence(certificateDigest)))] }),
  ].sort((a, b) => Buffer.compare(Buffer.from(a.toSchema().toBER()), Buffer.from(b.toSchema().toBER())))
}

/** The bytes that the signer signs: the attributes as one SET, DER. Source: RFC 5652, section 5.4. */
export function attributesToSign(documentDigest: Uint8Array, certificate: Uint8Array): Uint8Array {
  const attributes = signedAttributes(documentDigest, certificate).map((attribute) => attribute.toSchema())
  return new Uint8Array(new asn1js.Set({ value: attributes }).toBER())
}
