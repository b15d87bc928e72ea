import { AFRelationship, PDFDocument } from '@cantoo/pdf-lib'
import type { Place } from '../paper/paper'
import type { RenderedPages } from '../render-pages'
import type { ReportInput } from '../report-input'
import { labelHeights, signatureBoxes } from '../sections/cover'
import type { Wording } from '../wording/en'
import { attachmentsOf } from './attachments'
import { embedSignOffFont } from './sign-off-font'
import { addSignatureFields, type SignatureField } from './signature-fields'

/** Name of the font of signature blocks among the form's resources. */
const signOffFont = 'SignOff'

/** Between the frame of a box and its field. */
const margin = 4

/** The fields in the order of signing, one for a licensee's seal, and an invisible one for a document time stamp. */
const fieldsOf = ({ places }: RenderedPages, { frame }: Wording): readonly SignatureField[] => {
  const below = (id: string, label: number): Place => {
    const box = places.get(id)
    if (!box) throw new Error(`The box ${id} was not laid out.`)
    const { page, left, top, width, height } = box
    return { page, left: left + margin, top: top + label, width: width - 2 * margin, height: height - label - margin }
  }
  const { cover } = frame
  return [
    { name: 'Prepared', label: cover.roles.prepared, place: below(signatureBoxes.prepared, labelHeights.person) },
    { name: 'Checked', label: cover.roles.checked, place: below(signatureBoxes.checked, labelHeights.person) },
    { name: 'Approved', label: cover.roles.approved, place: below(signatureBoxes.approved, labelHeights.person) },
    { name: 'Seal', label: cover.seal, place: below(signatureBoxes.seal, labelHeights.seal) },
    { name: 'ArchiveTimestamp', label: cover.archive, place: null },
  ]
}

/**
 * Makes the painted pages a report: study and results attached, archival metadata (PDF/A-3b) and, unless it is a draft,
 * empty signature fields. Saved in full for the last time; signatures are appended. Equal input gives equal bytes.
 */
export const finishReport = async (pages: RenderedPages, input: ReportInput, words: Wording): Promise<Uint8Array> => {
  const document = await PDFDocument.load(pages.bytes, { updateMetadata: false })
  const frozen = new Date(input.revision.frozenAt)
  for (const { name, bytes, description } of attachmentsOf(input)) {
    await document.attach(bytes, name, {
      mimeType: 'application/json',
      description,
      creationDate: frozen,
      modificationDate: frozen,
      afRelationship: name === 'study.json' ? AFRelationship.Source : AFRelationship.Data,
    })
  }
  document.convertToPDFA({ conformance: '3B' })
  if (!input.draft) {
    const reference = await embedSignOffFont(document)
    addSignatureFields(document, fieldsOf(pages, words), { name: signOffFont, reference })
  }
  return document.save({ useObjectStreams: false, addDefaultPage: false, updateFieldAppearances: false })
}
