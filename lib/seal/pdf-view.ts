import {
  PDFArray,
  PDFDict,
  PDFName,
  PDFNumber,
  type PDFObject,
  PDFObjectParser,
  PDFRawStream,
  PDFRef,
} from '@cantoo/pdf-lib'
import { broken, type PdfFile, parsing } from './pdf-revisions'

/** The objects of a file as they stood after one of its revisions. */
export class PdfView {
  readonly file: PdfFile
  readonly revision: number
  readonly #offsets: ReadonlyMap<number, number>

  /** Looks at the file after revision `revision` (0 = as first written); the last one by default. */
  constructor(file: PdfFile, revision = file.revisions.length - 1) {
    this.file = file
    this.revision = revision
    const offsets = new Map<number, number>()
    for (const { offsets: written, freed } of file.revisions.slice(0, revision + 1)) {
      for (const number of freed) offsets.delete(number)
      for (const [number, offset] of written) offsets.set(number, offset)
    }
    this.#offsets = offsets
  }

  /** The numbers of all objects that exist at this revision. */
  get numbers(): Iterable<number> {
    return this.#offsets.keys()
  }

  has(number: number): boolean {
    return this.#offsets.has(number)
  }

  /** The object itself; undefined if there is none of that number. */
  object(number: number): PDFObject | undefined {
    const offset = this.#offsets.get(number)
    if (offset === undefined) return undefined
    const known = this.file.parsed.get(offset)
    if (known) return known
    const object = readObjectAt(this.file, number, offset)
    this.file.parsed.set(offset, object)
    return object
  }

  /** The value behind a reference, or the value itself. */
  resolve(value: PDFObject | undefined): PDFObject | undefined {
    return value instanceof PDFRef ? this.object(value.objectNumber) : value
  }

  dict(value: PDFObject | undefined): PDFDict | undefined {
    const resolved = this.resolve(value)
    return resolved instanceof PDFDict ? resolved : undefined
  }

  /** The items of an array; none if it is not one. */
  items(value: PDFObject | undefined): PDFObject[] {
    const resolved = this.resolve(value)
    return resolved instanceof PDFArray ? resolved.asArray() : []
  }

  stream(value: PDFObject | undefined): PDFRawStream | undefined {
    const resolved = this.resolve(value)
    return resolved instanceof PDFRawStream ? resolved : undefined
  }

  /** The numbers of an array, for example a rectangle; undefined unless all items are numbers. */
  numbersOf(value: PDFObject | undefined): number[] | undefined {
    const numbers = this.items(value).flatMap((item) => (item instanceof PDFNumber ? [item.asNumber()] : []))
    return numbers.length > 0 && numbers.length === this.items(value).length ? numbers : undefined
  }

  get trailer(): PDFDict {
    return this.file.revisions[this.revision]!.trailer
  }

  get catalogNumber(): number {
    const root = this.trailer.get(PDFName.of('Root'))
    if (root instanceof PDFRef) return root.objectNumber
    throw broken('its catalog is missing')
  }

  get catalog(): PDFDict {
    const catalog = this.dict(PDFRef.of(this.catalogNumber))
    if (catalog) return catalog
    throw broken('its catalog is missing')
  }
}

const name = (key: string) => PDFName.of(key)

/** An entry of a dictionary by its plain key, not resolved. */
export function entry(dict: PDFDict | undefined, key: string): PDFObject | undefined {
  return dict?.get(name(key))
}

/** Where the value of an object begins: after `12 0 obj` and the line end. */
export function objectStart(file: PdfFile, number: number, offset: number): number {
  const head = Buffer.from(
    file.bytes.buffer,
    file.bytes.byteOffset + offset,
    Math.min(24, Math.max(0, file.bytes.length - offset)),
  )
  const found = /^(\d{1,10}) 0 obj\s/.exec(head.toString('latin1'))
  if (!found || Number(found[1]) !== number) throw broken(`object ${number} is not where the table says`)
  return offset + found[0].length
}

function readObjectAt(file: PdfFile, number: number, offset: number): PDFObject {
  if (offset >= file.bytes.length) throw broken(`object ${number} is not where the table says`)
  const from = objectStart(file, number, offset)
  return parsing(() => PDFObjectParser.forBytes(file.bytes.subarray(from), file.context).parseObject())
}
