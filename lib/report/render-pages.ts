import layoutDocument, { type SafeDocumentNode } from '@react-pdf/layout'
import renderPDF from '@react-pdf/render'
import { Font, pdf } from '@react-pdf/renderer'
import PDFDocument from 'pdfkit'
import { Paper, type Place } from './paper/paper'
import { findPlaces } from './places'
import type { ReportInput } from './report-input'
import { studyReport } from './study-report'
import type { Pdf } from './type/paint-text'
import type { Wording } from './wording/en'

// The published types leave out the font store, and take the class of the file for the file itself.
const layOut: (document: Parameters<typeof layoutDocument>[0], fonts: typeof Font) => Promise<SafeDocumentNode> =
  layoutDocument
const paintPages = (file: Pdf, layout: SafeDocumentNode) =>
  renderPDF(file as unknown as Parameters<typeof renderPDF>[0], layout)

export interface RenderedPages {
  bytes: Uint8Array
  places: ReadonlyMap<string, Place>
}

/**
 * Lays the report out once and paints it. The same input gives the same bytes: every date comes from the revision, and the
 * file's identity, which the package takes from the information dictionary, is made unique by number, revision and hash.
 */
export const renderPages = async (input: ReportInput, words: Wording): Promise<RenderedPages> => {
  const paper = new Paper()
  const { container } = pdf(studyReport(input, words, paper))
  const layout = await layOut(container.document, Font)
  const places = findPlaces(layout)
  const { head } = input.document
  const frozen = new Date(input.revision.frozenAt)
  const file = new PDFDocument({
    subset: 'PDF/A-3b',
    pdfVersion: '1.7',
    lang: words.language,
    displayTitle: true,
    autoFirstPage: false,
    info: {
      Title: `${head.documentNumber} ${head.title}`,
      Author: head.organisation,
      Subject: words.frame.kind,
      Keywords: `${head.documentNumber}, ${words.frame.revision} ${input.revision.number}, ${input.revision.documentHash}`,
      Creator: 'Breakaway',
      Producer: 'Breakaway',
      CreationDate: frozen,
      ModDate: frozen,
    },
  })
  const chunks: Uint8Array[] = []
  const finished = new Promise<void>((resolve, reject) => {
    file.on('data', (chunk: Uint8Array) => chunks.push(chunk))
    file.on('end', resolve)
    file.on('error', reject)
  })
  paper.open(file, places)
  paintPages(file, layout)
  await finished
  return { bytes: new Uint8Array(Buffer.concat(chunks)), places }
}
