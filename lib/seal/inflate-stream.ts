import { inflateSync } from 'node:zlib'
import { PDFName, type PDFRawStream } from '@cantoo/pdf-lib'
import { DomainError } from '@/lib/errors'

/**
 * The contents of a stream, unpacked to at most `limit` octets: `too-large` beyond it, so that a small file cannot unpack to a huge one,
 * and `unsupported` for any packing but the plain one in which reports are written.
 */
export function inflateStream(stream: PDFRawStream, limit: number): Uint8Array {
  const filter = stream.dict.get(PDFName.of('Filter'))
  if (filter === undefined) return stream.getContents()
  if (filter !== PDFName.of('FlateDecode') || stream.dict.has(PDFName.of('DecodeParms'))) {
    throw new DomainError('unsupported', 'A part of the file is packed in a way that reports never use.')
  }
  try {
    return new Uint8Array(inflateSync(stream.getContents(), { maxOutputLength: limit }))
  } catch (error) {
    if (error instanceof RangeError)
      throw new DomainError('too-large', 'A part of the file unpacks to more than any report holds.')
    throw new DomainError('invalid', 'A part of the file is damaged and cannot be unpacked.')
  }
}
