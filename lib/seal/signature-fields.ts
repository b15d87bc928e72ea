import { PDFDocument, PDFHexString, PDFName } from '@cantoo/pdf-lib'
import { embedSealFont } from './embed-seal-font'
import { sealFontName } from './seal-font'

/** Where one person signs: the field, the words of its block, the page (counted from 0) and the rectangle on it. */
export interface SignaturePlace {
  readonly name: string
  readonly role: string
  readonly page: number
  /** Left, bottom, right, top in points from the lower left corner of the page. */
  readonly rectangle: readonly [number, number, number, number]
}

/** What makes a rendered report ready to be signed. */
export interface SignaturePlaces {
  readonly fields: readonly SignaturePlace[]
  /** The invisible field for a later document time stamp. */
  readonly archiveField: string
  /** The TrueType font of the signature blocks (Source Sans, regular). */
  readonly font: Uint8Array
}

/**
 * Adds empty signature fields to a rendered report and saves it in full, for the last time: after the first signature only appended
 * revisions are allowed. Each field carries an empty appearance, as archival PDF demands, and the font of later signature blocks goes
 * into the file once. Equal input gives equal bytes. Source: ISO 32000-1, sections 12.7.4.5 and 12.5.5.
 */
export async function addSignatureFields(pdf: Uint8Array, places: SignaturePlaces): Promise<Uint8Array> {
  const document = await PDFDocument.load(pdf, { updateMetadata: false })
  if (document.catalog.has(PDFName.of('AcroForm'))) throw new Error('the report has form fields already')
  const { context } = document
  const font = await embedSealFont(document, places.font)
  const archive: SignaturePlace = {
    name: places.archiveField,
    role: 'Archive time stamp',
    page: 0,
    rectangle: [0, 0, 0, 0],
  }
  const fields = [...places.fields, archive].map((place) => addField(document, place))
  document.catalog.set(
    PDFName.of('AcroForm'),
    context.obj({
      Fields: fields,
      // Signatures exist, and the file may only be appended to.
      SigFlags: 3,
      DR: { Font: { [sealFontName]: font } },
    }),
  )
  return document.save({ useObjectStreams: false, addDefaultPage: false, updateFieldAppearances: false })
}

function addField(document: PDFDocument, place: SignaturePlace) {
  const { context } = document
  const [left, bottom, right, top] = place.rectangle
  const page = document.getPage(place.page)
  const appearance = context.stream('', {
    Type: 'XObject',
    Subtype: 'Form',
    BBox: [0, 0, right - left, top - bottom],
    Resources: {},
  })
  const field = context.register(
    context.obj({
      Type: 'Annot',
      Subtype: 'Widget',
      FT: 'Sig',
      T: PDFHexString.fromText(place.name),
      TU: PDFHexString.fromText(place.role),
      // Print: archival PDF wants each annotation to appear on paper as on the screen.
      F: 4,
      P: page.ref,
      Rect: [...place.rectangle],
      AP: { N: context.register(appearance) },
    }),
  )
  page.node.addAnnot(field)
  return field
}
