import { type PDFContext, type PDFDict, PDFHexString, PDFName, PDFString } from '@cantoo/pdf-lib'
import { printPdfDate } from './pdf-date'

/** Room for one signature with its certificates and a time stamp, octets; it is filled with zeros behind what is used. */
export const contentsLength = 8192

/** The bytes that a signature covers: two stretches, given as offset and length each, with only its own contents between them. */
export type ByteRange = readonly [number, number, number, number]

/** What a signature's dictionary states beside the signature itself. */
export interface SignatureStatement {
  readonly name: string
  readonly at: Date
  readonly reason?: string | undefined
  readonly location?: string | undefined
  /** The file's first signature certifies it: from then on only form fields may be filled and signatures added. */
  readonly certifies: boolean
}

/**
 * Makes a signature's dictionary with zeros where the signature will stand.
 * Source: ISO 32000-1, sections 12.8.1 and 12.8.2.2; ETSI EN 319 142-1, section 6.3.
 */
export function signatureDictionary(context: PDFContext, statement: SignatureStatement, range: ByteRange): PDFDict {
  const { name, at, reason, location, certifies } = statement
  const dict = context.obj({
    Type: 'Sig',
    Filter: 'Adobe.PPKLite',
    SubFilter: 'ETSI.CAdES.detached',
    ByteRange: [...range],
    Contents: PDFHexString.of('00'.repeat(contentsLength)),
    Name: PDFHexString.fromText(name),
    M: PDFString.of(printPdfDate(at)),
  })
  if (reason) dict.set(PDFName.of('Reason'), PDFHexString.fromText(reason))
  if (location) dict.set(PDFName.of('Location'), PDFHexString.fromText(location))
  if (certifies) {
    const limits = { Type: 'TransformParams', P: 2, V: '1.2' }
    dict.set(
      PDFName.of('Reference'),
      context.obj([{ Type: 'SigRef', TransformMethod: 'DocMDP', TransformParams: limits }]),
    )
  }
  return dict
}
