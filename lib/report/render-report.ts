import { DomainError } from '../errors'
import { finishReport } from './finish/finish-report'
import { computeHandCheck } from './hand-check/compute-hand-check'
import { renderPages } from './render-pages'
import type { ReportInput } from './report-input'
import { glyphIssues } from './type/printable'
import { english } from './wording/en'

/**
 * Renders the report of a frozen revision as a PDF with the study attached; a final one has empty signature fields
 * Prepared, Checked, Approved and Seal, a draft a watermark instead. The same input gives the same bytes in every process
 * of one build. A text with a letter that no embedded font has is refused with its place, before anything is rendered.
 */
export const renderReport = async (input: ReportInput): Promise<Uint8Array> => {
  const { document, revision } = input
  const issues = glyphIssues({ document, revision })
  const first = issues[0]
  if (first) throw new DomainError('unsupported', first.message, issues)
  const handCheck = input.handCheck === undefined ? computeHandCheck(document) : input.handCheck
  const complete = { ...input, handCheck }
  const pages = await renderPages(complete, english)
  return finishReport(pages, complete, english)
}
