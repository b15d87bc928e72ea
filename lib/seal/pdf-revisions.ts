import { PDFContext, PDFDict, PDFName, PDFNumber, type PDFObject, PDFObjectParser } from '@cantoo/pdf-lib'
import { DomainError } from '@/lib/errors'
import { verificationLimits } from './verification-limits'

/** One saved state of a file: what its own cross-reference table adds to the revision before. */
export interface Revision {
  /** Where the bytes of this revision begin: the end of the one before, or 0. */
  readonly start: number
  /** The end of its end-of-file mark, with the line end that follows. */
  readonly end: number
  readonly xrefAt: number
  /** The offset of each object that this revision writes. */
  readonly offsets: ReadonlyMap<number, number>
  /** The objects that this revision declares free. */
  readonly freed: readonly number[]
  readonly trailer: PDFDict
}

/** A file as its cross-reference tables describe it; the objects are read when asked for. */
export interface PdfFile {
  readonly bytes: Uint8Array
  readonly context: PDFContext
  readonly revisions: readonly Revision[]
  /** The objects that have been read so far, by offset; shared by all views of the file. */
  readonly parsed: Map<number, PDFObject>
}

/**
 * Reads the chain of cross-reference tables from the end of the file to its beginning, as a viewer does. Only the plain form in which
 * reports are written is read: classic tables, no object streams, no encryption, generation 0. What else there is, is refused:
 * `too-large` beyond the limits, `unsupported` for another form, `invalid` for a broken one. Source: ISO 32000-1, section 7.5.
 */
export function readRevisions(bytes: Uint8Array): PdfFile {
  if (bytes.length > verificationLimits.bytes)
    throw new DomainError('too-large', 'The file is larger than 20 MB: no report is.')
  const buffer = Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength)
  if (buffer.toString('latin1', 0, 5) !== '%PDF-')
    throw new DomainError('invalid', 'This is not a PDF file: choose the report itself.')

  const context = PDFContext.create()
  const newestFirst: Omit<Revision, 'start'>[] = []
  let xrefAt: number | undefined = lastTableOffset(buffer)
  let objects = 0
  while (xrefAt !== undefined) {
    const revision = readRevision(buffer, xrefAt, context)
    newestFirst.push(revision)
    objects += revision.offsets.size
    if (newestFirst.length > verificationLimits.revisions || objects > verificationLimits.objects) {
      throw new DomainError('too-large', 'The file holds more revisions or objects than any report does.')
    }
    const previous: number | undefined = numberEntry(revision.trailer, 'Prev')
    // Each step must lead towards the beginning: a loop or a jump ahead is no history.
    if (previous !== undefined && previous >= xrefAt) throw broken('its revisions do not follow one another')
    xrefAt = previous
  }
  return { bytes, context, revisions: chain(newestFirst.reverse()), parsed: new Map() }
}

function chain(oldestFirst: readonly Omit<Revision, 'start'>[]): Revision[] {
  return oldestFirst.map((revision, index) => {
    const start = oldestFirst[index - 1]?.end ?? 0
    if (revision.xrefAt < start) throw broken('its revisions overlap')
    return { ...revision, start }
  })
}

function lastTableOffset(buffer: Buffer): number {
  const mark = buffer.lastIndexOf('startxref', undefined, 'latin1')
  const found = mark < 0 ? null : /^startxref\s+(\d{1,10})\s/.exec(buffer.toString('latin1', mark, mark + 40))
  if (!found) throw broken('its end is missing')
  return Number(found[1])
}

function readRevision(buffer: Buffer, xrefAt: number, context: PDFContext): Omit<Revision, 'start'> {
  if (buffer.toString('latin1', xrefAt, xrefAt + 5) !== 'xref\n') {
    throw new DomainError(
      'unsupported',
      'The file is not in the form in which reports are issued: another program wrote it anew.',
    )
  }
  const table = readTable(buffer, xrefAt + 5)
  const trailer = readTrailer(buffer, table.end, context)
  if (trailer.has(PDFName.of('Encrypt')))
    throw new DomainError('invalid', 'The file is encrypted, which reports never are: ask for the report itself.')
  if (trailer.has(PDFName.of('XRefStm')))
    throw new DomainError('unsupported', 'The file mixes two forms of object tables: reports never do.')
  const mark = buffer.indexOf('startxref', table.end, 'latin1')
  const tail =
    mark < 0 ? null : /^startxref\n(\d{1,10})\n%%EOF(?:\r\n|\n|\r)?/.exec(buffer.toString('latin1', mark, mark + 40))
  if (!tail || Number(tail[1]) !== xrefAt) throw broken('a revision has no proper end')
  return { xrefAt, end: mark + tail[0].length, offsets: table.offsets, freed: table.freed, trailer }
}

/** Reads the subsections after the word `xref`; each entry takes 20 octets. */
function readTable(buffer: Buffer, from: number) {
  const offsets = new Map<number, number>()
  const freed: number[] = []
  let at = from
  for (;;) {
    const head = /^(\d{1,8}) (\d{1,8})[ ]?\r?\n/.exec(buffer.toString('latin1', at, at + 24))
    if (!head) return { offsets, freed, end: at }
    at += head[0].length
    const first = Number(head[1])
    const count = Number(head[2])
    if (count > verificationLimits.objects)
      throw new DomainError('too-large', 'The file holds more objects than any report does.')
    for (let number = first; number < first + count; number += 1, at += 20) {
      const entry = /^(\d{10}) (\d{5}) ([nf])(?: \n| \r|\r\n)$/.exec(buffer.toString('latin1', at, at + 20))
      if (!entry || offsets.has(number)) throw broken('its table of objects is damaged')
      if (entry[3] === 'f') {
        if (number !== 0) freed.push(number)
      } else if (Number(entry[2]) !== 0) throw broken('an object has a second generation')
      else offsets.set(number, Number(entry[1]))
    }
  }
}

function readTrailer(buffer: Buffer, from: number, context: PDFContext): PDFDict {
  const word = /^\s*trailer\s/.exec(buffer.toString('latin1', from, from + 12))
  if (!word) throw broken('a revision has no trailer')
  const trailer = parsing(() => PDFObjectParser.forBytes(buffer.subarray(from + word[0].length), context).parseObject())
  if (trailer instanceof PDFDict) return trailer
  throw broken('a revision has no trailer')
}

function numberEntry(dict: PDFDict, key: string): number | undefined {
  const value = dict.get(PDFName.of(key))
  return value instanceof PDFNumber ? value.asNumber() : undefined
}

/** Runs a step of the library's parser; whatever it trips over is a damaged file, not a defect of ours. */
export function parsing<T>(step: () => T): T {
  try {
    return step()
  } catch {
    throw broken('an object cannot be read')
  }
}

export const broken = (what: string) => new DomainError('invalid', `The file is damaged: ${what}. Ask for it again.`)
