import { renderReport } from '../report/render-report'
import type { ReportRevision } from '../report/report-input'
import { pageNumbers } from '../seal/pdf-pages'
import { readRevisions } from '../seal/pdf-revisions'
import { PdfView } from '../seal/pdf-view'
import type { StudyDocument } from '../study/document/study-document'
import { runDocument } from '../study/run-document'
import { documentHash, inputHash } from '../study/study-hashes'
import { studyRunInput } from '../study/to-engine/study-run-input'
import { type Figure, figure } from './figure'

/** A revision with fixed dates, so that two runs render the same file. */
const revisionOf = async (document: StudyDocument): Promise<ReportRevision> => ({
  number: 'A',
  state: 'review-closed',
  purpose: 'Measurement of the rendering time',
  frozenAt: '2026-01-01T00:00:00.000Z',
  documentHash: await documentHash(document),
  inputHash: await inputHash(studyRunInput(document)),
  auditHead: null,
  people: { prepared: null, checked: null, approved: null },
  table: [],
  decisions: [],
  waivers: [],
})

/** Seconds for the final PDF of a study, fonts warm and cold, and its pages. */
export const benchReport = async (name: string, document: StudyDocument): Promise<Figure[]> => {
  const input = { document, result: runDocument(document), revision: await revisionOf(document), draft: false }
  const seconds: number[] = []
  let bytes = new Uint8Array()
  for (let i = 0; i < 2; i++) {
    const from = performance.now()
    bytes = new Uint8Array(await renderReport(input))
    seconds.push((performance.now() - from) / 1000)
  }
  const pages = pageNumbers(new PdfView(readRevisions(bytes))).length
  return [
    figure(`${name}: time of the first rendering`, seconds[0] ?? Number.NaN, 's'),
    figure(`${name}: time of the second rendering`, seconds[1] ?? Number.NaN, 's'),
    figure(`${name}: pages`, pages, '1'),
    figure(`${name}: size`, bytes.length / 1000, 'kB'),
  ]
}
