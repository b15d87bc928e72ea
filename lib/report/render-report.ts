import { finishReport } from './finish/finish-report'
import { renderPages } from './render-pages'
import type { ReportInput } from './report-input'
import { english } from './wording/en'

/**
 * Renders the report of a frozen revision as a PDF with the study attached; a final one has empty signature fields
 * Prepared, Checked, Approved and Seal, a draft a watermark instead. The same input gives the same bytes in every process
 * of one build. Throws when a text needs a glyph that no embedded font has.
 */
export const renderReport = async (input: ReportInput): Promise<Uint8Array> => {
  const pages = await renderPages(input, english)
  return finishReport(pages, input, english)
}
