import { PDFDict, PDFHexString, PDFName, type PDFObject, PDFRawStream, PDFRef } from '@cantoo/pdf-lib'
import { revisionTail, serialise } from './pdf-increment'
import { pagesShowing } from './pdf-pages'
import type { PdfFile } from './pdf-revisions'
import { entry, PdfView } from './pdf-view'
import { type SignatureEntry, signatureEntries } from './signature-entries'
import type { Finding } from './verdict'

/**
 * Checks that a revision (counted from 0, and not the first) adds one signature and nothing else. Viewers rarely make this comparison: they
 * call a signature valid even if what was appended after it paints over a page. The revision must be written, octet for octet, in the one
 * form in which signing writes it, so that no two readers can see different things in it.
 */
export function checkRevision(file: PdfFile, index: number): Finding[] {
  const before = new PdfView(file, index - 1)
  const after = new PdfView(file, index)
  const signed = newlySigned(before, after)
  const findings: Finding[] = []
  if (!isStrictlyWritten(before, after)) {
    findings.push({
      kind: 'structure',
      sentence: `Revision ${index + 1} of the file holds bytes that no signing step writes.`,
    })
  }
  if (!signed) {
    findings.push({
      kind: 'unsigned-revision',
      sentence: `Revision ${index + 1} of the file was appended without a signature.`,
    })
  }
  return [...findings, ...changeFindings(after, foreignObjects(before, after, signed), index)]
}

function changeFindings(after: PdfView, foreign: ReadonlySet<number>, index: number): Finding[] {
  if (foreign.size === 0) return []
  const pages = pagesShowing(after, foreign)
  if (pages.length === 0) {
    return [
      { kind: 'changed-object', sentence: `Revision ${index + 1} changes parts of the file other than a signature.` },
    ]
  }
  const which = pages.length === 1 ? `page ${pages[0]}` : `pages ${pages.join(', ')}`
  return [{ kind: 'changed-page', sentence: `Revision ${index + 1} changes the look of ${which}.`, pages }]
}

/** The one field that is signed after and was not before. */
function newlySigned(before: PdfView, after: PdfView): SignatureEntry | undefined {
  const open = new Set(
    signatureEntries(before)
      .filter((entry) => !entry.signature)
      .map((entry) => entry.number),
  )
  const signed = signatureEntries(after).filter((entry) => entry.signature && open.has(entry.number))
  return signed.length === 1 ? signed[0] : undefined
}

/** The objects of a revision that do not belong to its signature. */
function foreignObjects(before: PdfView, after: PdfView, signed: SignatureEntry | undefined): Set<number> {
  const { offsets, freed } = after.file.revisions[after.revision]!
  const foreign = new Set([...freed, ...offsets.keys()])
  for (const number of offsets.keys()) {
    if (signed && belongsToSignature(before, after, signed, number)) foreign.delete(number)
  }
  return foreign
}

function belongsToSignature(before: PdfView, after: PdfView, signed: SignatureEntry, number: number): boolean {
  const object = after.object(number)
  if (number === signed.signature?.number)
    return !before.has(number) && entry(signed.signature.dict, 'Type') === PDFName.of('Sig')
  if (number === signed.number) return sameBut(before, number, object, ['V', 'AP'])
  if (number === appearanceOf(signed)) return !before.has(number) && object instanceof PDFRawStream
  // The catalog may change once, by the signature that certifies.
  if (number !== after.catalogNumber || signatureEntries(before).some((other) => other.signature)) return false
  const certified = entry(after.dict(entry(after.catalog, 'Perms')), 'DocMDP')
  return (
    certified instanceof PDFRef &&
    certified.objectNumber === signed.signature?.number &&
    sameBut(before, number, object, ['Perms'])
  )
}

function appearanceOf(signed: SignatureEntry): number | undefined {
  const appearance = entry(signed.field, 'AP')
  const normal = appearance instanceof PDFDict && appearance.keys().length === 1 ? entry(appearance, 'N') : undefined
  return normal instanceof PDFRef ? normal.objectNumber : undefined
}

/** True when a dictionary differs from its earlier self in nothing but the given entries. */
function sameBut(before: PdfView, number: number, now: PDFObject | undefined, free: readonly string[]): boolean {
  const then = before.object(number)
  if (!(then instanceof PDFDict) || !(now instanceof PDFDict)) return false
  const rest = (dict: PDFDict) => {
    const copy = dict.clone()
    for (const key of free) copy.delete(PDFName.of(key))
    return copy.toString()
  }
  return rest(then) === rest(now)
}

/** True when the revision is exactly its objects, end to end, its table and its trailer. */
function isStrictlyWritten(before: PdfView, after: PdfView): boolean {
  const { bytes, revisions } = after.file
  const { start, end, xrefAt, offsets, trailer } = revisions[after.revision]!
  const own = Buffer.from(bytes.buffer, bytes.byteOffset + start, end - start)
  const written: Buffer[] = [Buffer.from(own.at(0) === 0x0a ? '\n' : '')]
  let at = start + written[0]!.length
  for (const [number, offset] of [...offsets].sort(([a], [b]) => a - b)) {
    if (offset !== at) return false
    const piece = serialise(number, after.object(number)!)
    written.push(piece)
    at += piece.length
  }
  const identifier = after.items(entry(trailer, 'ID'))[1]
  const second = identifier instanceof PDFHexString ? identifier.asBytes() : new Uint8Array()
  return (
    at === xrefAt &&
    Buffer.concat([...written, Buffer.from(revisionTail(before, offsets, at, second), 'latin1')]).equals(own)
  )
}
