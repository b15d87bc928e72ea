import { type PDFDict, PDFName, type PDFObject, PDFRef } from '@cantoo/pdf-lib'
import { DomainError } from '@/lib/errors'
import { type Certificate, readCertificate } from './certificate'
import { appendRevision, firstFreeNumber } from './pdf-increment'
import { readRevisions } from './pdf-revisions'
import { entry, PdfView } from './pdf-view'
import { readSealFont, sealFontName, sealFontOf } from './seal-font'
import { sha256 } from './sha256'
import { drawSignatureBlock } from './signature-block'
import { type ByteRange, contentsLength, signatureDictionary } from './signature-dictionary'
import { type SignatureEntry, signatureEntries } from './signature-entries'
import { attributesToSign } from './signed-attributes'

/** Who signs which field, when and why. */
export interface SignatureOrder {
  readonly field: string
  /** The signer's certificate, DER. The name in the block and in the file is the one in it. */
  readonly certificate: Uint8Array
  /** The certificates above it, nearest first, DER. */
  readonly chain: readonly Uint8Array[]
  readonly at: Date
  readonly reason?: string
  readonly location?: string
}

/** A file that waits for one signature value; all that the second step needs, as plain bytes that can be stored. */
export interface PreparedSignature {
  /** The file with its new revision and zeros where the signature will stand. */
  readonly pdf: Uint8Array
  /** The octets to sign with the signer's key (ECDSA P-256 with SHA-256). */
  readonly attributes: Uint8Array
  readonly range: ByteRange
  readonly certificate: Uint8Array
  readonly chain: readonly Uint8Array[]
}

/**
 * First step of signing: appends a revision with the signature's dictionary and visible block, and gives the octets that the signer must
 * sign, wherever the key is. The first signature of a file certifies it. Equal input gives equal bytes, so that the step can be repeated
 * instead of stored. Refused: `not-found` without such a field, `wrong-state` if it is signed, `invalid` if the certificate is not in
 * force, and whatever a damaged or foreign file is refused with.
 */
export function prepareSignature(pdf: Uint8Array, order: SignatureOrder): PreparedSignature {
  const view = new PdfView(readRevisions(pdf))
  const entries = signatureEntries(view)
  const target = openField(entries, order.field)
  const signer = readCertificate(order.certificate)
  if (order.at < signer.notBefore || order.at > signer.notAfter) {
    throw new DomainError(
      'invalid',
      `The certificate of ${signer.subject.name} is not in force at this time: make a new signing key.`,
    )
  }
  const certifies = entries.every((other) => other.signature === undefined)
  const { bytes, range } = append(view, target, signer, order, certifies)
  const attributes = attributesToSign(digestOfRange(bytes, range), order.certificate)
  return { pdf: bytes, attributes, range, certificate: order.certificate, chain: order.chain }
}

/** SHA-256 of the bytes that a signature covers. */
export function digestOfRange(pdf: Uint8Array, [first, length, second, rest]: ByteRange): Uint8Array {
  return sha256(pdf.subarray(first, first + length), pdf.subarray(second, second + rest))
}

function openField(entries: readonly SignatureEntry[], name: string): SignatureEntry {
  const found = entries.find((candidate) => candidate.name === name)
  if (!found)
    throw new DomainError('not-found', `The report has no place for the signature "${name}": render it again.`)
  if (found.signature) throw new DomainError('wrong-state', `"${found.role}" has already been signed on this report.`)
  return found
}

function append(view: PdfView, target: SignatureEntry, signer: Certificate, order: SignatureOrder, certifies: boolean) {
  const { context } = view.file
  const signature = firstFreeNumber(view)
  const appearance = signature + 1
  const objects = new Map<number, PDFObject>([
    [appearance, drawAppearance(view, target, signer, order.at)],
    [
      target.number,
      withEntries(target.field, { V: PDFRef.of(signature), AP: context.obj({ N: PDFRef.of(appearance) }) }),
    ],
  ])
  if (certifies)
    objects.set(view.catalogNumber, withEntries(view.catalog, { Perms: context.obj({ DocMDP: PDFRef.of(signature) }) }))

  const statement = {
    name: signer.subject.name,
    at: order.at,
    reason: order.reason,
    location: order.location,
    certifies,
  }
  let range: ByteRange = [0, 0, 0, 0]
  // The range stands in the bytes that it measures: written again until its own digits no longer move anything.
  for (let round = 0; round < 8; round += 1) {
    objects.set(signature, signatureDictionary(context, statement, range))
    const { bytes, offsets } = appendRevision(view, objects)
    const measured = measure(bytes, offsets.get(signature)!)
    if (measured.every((value, index) => value === range[index])) return { bytes, range }
    range = measured
  }
  throw new Error('the byte range of a signature does not settle')
}

/** The range around the contents of the signature whose object begins at `from`. */
function measure(bytes: Uint8Array, from: number): ByteRange {
  const start =
    Buffer.from(bytes.buffer, bytes.byteOffset, bytes.length).indexOf('/Contents <', from, 'latin1') +
    '/Contents '.length
  const end = start + 2 * contentsLength + 2
  return [0, start, end, bytes.length - end]
}

function drawAppearance(view: PdfView, target: SignatureEntry, signer: Certificate, at: Date): PDFObject {
  const font = sealFontOf(view)
  const rectangle = view.numbersOf(entry(target.field, 'Rect'))
  if (!font || rectangle?.length !== 4)
    throw new DomainError('unsupported', 'The report was not made ready for signing: render it again.')
  const [left, bottom, right, top] = rectangle
  const [width, height] = [right! - left!, top! - bottom!]
  const block = { role: target.role, ...signer.subject, at, fingerprint: signer.fingerprint }
  const drawing = drawSignatureBlock(block, readSealFont(view, font), sealFontName, width, height)
  const resources = { Font: { [sealFontName]: font } }
  return view.file.context.stream(drawing, {
    Type: 'XObject',
    Subtype: 'Form',
    BBox: [0, 0, width, height],
    Resources: resources,
  })
}

/** A copy of the dictionary with some entries set, in a fixed place: at the end. */
function withEntries(dict: PDFDict, entries: Record<string, PDFObject>): PDFDict {
  const copy = dict.clone()
  for (const [key, value] of Object.entries(entries)) {
    copy.delete(PDFName.of(key))
    copy.set(PDFName.of(key), value)
  }
  return copy
}
