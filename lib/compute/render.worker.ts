import { pageCount } from '../report/page-count'
import { renderReport } from '../report/render-report'
import type { ReportInput } from '../report/report-input'

/** A rendered PDF and its number of pages. */
export interface RenderedReport {
  pdf: Uint8Array
  pages: number
}

/** The task of a rendering thread. */
export async function render(input: ReportInput): Promise<RenderedReport> {
  const pdf = await renderReport(input)
  return { pdf, pages: await pageCount(pdf) }
}
