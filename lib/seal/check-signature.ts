import { PDFHexString } from '@cantoo/pdf-lib'
import { readCertificate } from './certificate'
import { certificateDefect } from './certificate-defect'
import { type CmsParts, decodeCms } from './cms'
import { verifiesP256 } from './key-proof'
import { readPdfDate } from './pdf-date'
import { entry, type PdfView } from './pdf-view'
import { digestOfRange } from './prepare-signature'
import type { ByteRange } from './signature-dictionary'
import { type SignatureEntry, textOf } from './signature-entries'
import { attributesToSign } from './signed-attributes'
import type { Finding, FindingKind } from './verdict'

/** What one signature is found to be, before anybody asks whether its certificate counts. */
export interface CheckedSignature {
  readonly entry: SignatureEntry
  /** The revision that brought it, counted from 0. */
  readonly revision: number
  /** The end of what it covers. */
  readonly end: number
  readonly parts: CmsParts | undefined
  readonly at: Date | undefined
  readonly findings: readonly Finding[]
}

/** Checks a signature by itself: what it covers, its form, the digest, the value, and the certificate's own form. */
export function checkSignature(view: PdfView, signed: SignatureEntry): CheckedSignature {
  const { number, dict } = signed.signature!
  const { file } = view
  const revision = file.revisions.findLastIndex((candidate) => candidate.offsets.has(number))
  const { offsets, end } = file.revisions[revision]!
  const findings: Finding[] = []
  const find = (kind: FindingKind, sentence: string) => findings.push({ kind, sentence, field: signed.name })

  const contents = view.resolve(entry(dict, 'Contents'))
  const hex = contents instanceof PDFHexString ? contents.asString() : ''
  const range = view.numbersOf(entry(dict, 'ByteRange')) ?? []
  if (!isRangeAround(file.bytes, range, `<${hex}>`, offsets.get(number)!, end)) {
    find('byte-range', `"${signed.role}" does not cover its whole revision of the file.`)
  }
  const parts = readContents(hex, signed, find)
  if (parts && isByteRange(range)) {
    if (!Buffer.from(parts.documentDigest).equals(digestOfRange(file.bytes, range))) {
      find('content-altered', `What "${signed.role}" signed has been altered since.`)
    }
    const { spki } = readCertificate(parts.certificate)
    if (!verifiesP256(spki, attributesToSign(parts.documentDigest, parts.certificate), parts.value)) {
      find('signature-value', `The value of the signature "${signed.role}" was not made with its certificate's key.`)
    }
    const defect = certificateDefect(parts.certificate, parts.chain)
    if (defect) find('certificate-form', `The certificate of "${signed.role}" cannot be used: ${defect}.`)
  }
  return { entry: signed, revision, end, parts, at: readPdfDate(textOf(view.resolve(entry(dict, 'M')))), findings }
}

function isByteRange(range: readonly number[]): range is ByteRange {
  return range.length === 4 && range.every((value) => Number.isSafeInteger(value) && value >= 0)
}

/** The range must start at 0, leave out the signature's own contents and no more, and end with the revision. */
function isRangeAround(
  bytes: Uint8Array,
  range: readonly number[],
  gap: string,
  objectAt: number,
  end: number,
): boolean {
  if (!isByteRange(range)) return false
  const [first, length, second, rest] = range
  const left = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.length).toString(
    'latin1',
    length,
    Math.max(length, second),
  )
  return first === 0 && left === gap && length > objectAt && second + rest === end
}

function readContents(hex: string, signed: SignatureEntry, find: (kind: FindingKind, sentence: string) => void) {
  const octets = /^(?:[0-9a-f]{2})+$/.test(hex) ? new Uint8Array(Buffer.from(hex, 'hex')) : new Uint8Array()
  const used = lengthOfDer(octets)
  if (octets.subarray(used).some((octet) => octet !== 0)) {
    find('padding', `There are bytes hidden behind the signature "${signed.role}".`)
  }
  const parts = decodeCms(octets.subarray(0, used))
  if (!parts) find('signature-form', `The signature "${signed.role}" is damaged, or another program made it.`)
  return parts
}

/** The length of the DER value that begins the octets, with its head; 0 if there is none. Source: ITU-T X.690, section 8.1.3. */
function lengthOfDer(octets: Uint8Array): number {
  const [tag, first] = octets
  if (tag !== 0x30 || first === undefined) return 0
  if (first < 0x80) return 2 + first
  const count = first & 0x7f
  if (count === 0 || count > 3) return 0
  const length = octets.subarray(2, 2 + count).reduce((sum, octet) => sum * 256 + octet, 0)
  return Math.min(octets.length, 2 + count + length)
}
