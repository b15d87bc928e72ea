import { type PDFDocument, PDFHexString, PDFName, type PDFRef } from '@cantoo/pdf-lib'
import type { Place } from '../paper/paper'

/** An empty signature field on a page; without a place it is invisible. */
export interface SignatureField {
  name: string
  /** What a viewer says about the field. */
  label: string
  place: Place | null
}

const rectangle = (place: Place | null, pageHeight: number): [number, number, number, number] =>
  place === null
    ? [0, 0, 0, 0]
    : ([place.left, pageHeight - place.top - place.height, place.left + place.width, pageHeight - place.top].map(
        (value) => Math.round(value * 100) / 100,
      ) as [number, number, number, number])

const addField = (document: PDFDocument, { name, label, place }: SignatureField): PDFRef => {
  const { context } = document
  const page = document.getPage((place?.page ?? 1) - 1)
  const rect = rectangle(place, page.getHeight())
  // Archival PDF wants an appearance on every field, even an empty one.
  const appearance = context.stream('', {
    Type: 'XObject',
    Subtype: 'Form',
    BBox: [0, 0, rect[2] - rect[0], rect[3] - rect[1]],
    Resources: {},
  })
  const field = context.register(
    context.obj({
      Type: 'Annot',
      Subtype: 'Widget',
      FT: 'Sig',
      T: PDFHexString.fromText(name),
      TU: PDFHexString.fromText(label),
      F: 4,
      P: page.ref,
      Rect: rect,
      AP: { N: context.register(appearance) },
    }),
  )
  page.node.addAnnot(field)
  return field
}

/**
 * Adds the form with its empty signature fields. The font of later signature blocks is put into the form's resources, so
 * that signing needs no font file and only appends to the file. Source: ISO 32000-1, sections 12.7.2 and 12.7.4.5.
 */
export const addSignatureFields = (
  document: PDFDocument,
  fields: readonly SignatureField[],
  font: { name: string; reference: PDFRef },
): void => {
  const references = fields.map((field) => addField(document, field))
  document.catalog.set(
    PDFName.of('AcroForm'),
    document.context.obj({
      Fields: references,
      // Signatures may exist, and the file may only be appended to.
      SigFlags: 3,
      DR: { Font: { [font.name]: font.reference } },
    }),
  )
}
