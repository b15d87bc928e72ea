import { type PDFDict, PDFHexString, PDFName, PDFNumber, type PDFObject } from '@cantoo/pdf-lib'
import type { PdfView } from './pdf-view'
import { sha256 } from './sha256'

/** An object as it stands in the file: `12 0 obj`, its value, `endobj`. */
export function serialise(number: number, object: PDFObject): Buffer {
  const body = Buffer.alloc(object.sizeInBytes())
  object.copyBytesInto(body, 0)
  return Buffer.concat([Buffer.from(`${number} 0 obj\n`), body, Buffer.from('\nendobj\n')])
}

/** The number that the next new object of a file gets. */
export function firstFreeNumber(view: PdfView): number {
  return Math.max(0, ...view.numbers) + 1
}

/**
 * Appends one revision that writes the given objects and nothing else; the bytes before stay as they are. Equal input gives equal bytes.
 * The caller finds the place of each object in `offsets`. Source: ISO 32000-1, section 7.5.6 (incremental updates).
 */
export function appendRevision(view: PdfView, objects: ReadonlyMap<number, PDFObject>) {
  const before = view.file.bytes
  const pieces: Buffer[] = [Buffer.from(before.at(-1) === 0x0a ? '' : '\n')]
  let at = before.length + pieces[0]!.length
  const offsets = new Map<number, number>()
  for (const number of [...objects.keys()].sort((a, b) => a - b)) {
    const piece = serialise(number, objects.get(number)!)
    offsets.set(number, at)
    pieces.push(piece)
    at += piece.length
  }
  // The second half of the file identifier must change with the contents, so it follows from them.
  pieces.push(Buffer.from(revisionTail(view, offsets, at, sha256(before, ...pieces).subarray(0, 16)), 'latin1'))
  return { bytes: new Uint8Array(Buffer.concat([before, ...pieces])), offsets }
}

/** What ends a revision that follows `before`: the table of its objects, the trailer, and where the table lies. */
export function revisionTail(
  before: PdfView,
  offsets: ReadonlyMap<number, number>,
  at: number,
  identifier: Uint8Array,
): string {
  return `${table(offsets)}trailer\n${trailer(before, offsets, identifier)}\nstartxref\n${at}\n%%EOF\n`
}

function table(offsets: ReadonlyMap<number, number>): string {
  let text = 'xref\n'
  for (const run of consecutive([...offsets.keys()])) {
    text += `${run[0]} ${run.length}\n`
    for (const number of run) text += `${String(offsets.get(number)).padStart(10, '0')} 00000 n \n`
  }
  return text
}

function consecutive(numbers: readonly number[]): number[][] {
  const runs: number[][] = []
  for (const number of numbers) {
    const last = runs.at(-1)
    if (last?.at(-1) === number - 1) last.push(number)
    else runs.push([number])
  }
  return runs
}

function trailer(view: PdfView, offsets: ReadonlyMap<number, number>, identifier: Uint8Array): PDFDict {
  const old = view.trailer
  const { context, revisions } = view.file
  const dict = context.obj({
    Size: Math.max(numberOf(old.get(PDFName.of('Size'))), ...[...offsets.keys()].map((number) => number + 1)),
    Prev: revisions[view.revision]!.xrefAt,
  })
  for (const key of ['Root', 'Info'].map((text) => PDFName.of(text))) {
    const value = old.get(key)
    if (value) dict.set(key, value)
  }
  const first = view.items(old.get(PDFName.of('ID')))[0]
  if (first) dict.set(PDFName.of('ID'), context.obj([first, PDFHexString.fromBytes(identifier)]))
  return dict
}

const numberOf = (value: PDFObject | undefined) => (value instanceof PDFNumber ? value.asNumber() : 0)
