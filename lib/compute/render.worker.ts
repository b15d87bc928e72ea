import { renderReport } from '../report/render-report'
import type { ReportInput } from '../report/report-input'

/** The task of a rendering thread: the PDF of a report as bytes. */
export const render = (input: ReportInput): Promise<Uint8Array> => renderReport(input)
