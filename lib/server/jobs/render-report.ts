import 'server-only'
import { DomainError } from '@/lib/errors'
import type { ReportInput } from '@/lib/report/report-input'
import type { Database } from '../db'
import { claimReport } from './claim-report'
import type { JobIds } from './enqueue'
import { failReport, handBackReport, type RenderedReport, storeReport } from './finish-report'
import type { JobTry } from './job'

/** Renders a report outside this thread; ends by throwing when the signal is aborted. */
export type RenderReport = (input: ReportInput, options: { signal: AbortSignal }) => Promise<RenderedReport>

/** Renders one report. It may run twice, or beside another worker's: only who holds it at the end stores a file. */
export async function renderReportJob(
  db: Database,
  ids: JobIds['render'],
  render: RenderReport,
  { stopping, last }: JobTry,
): Promise<void> {
  const report = await claimReport(db, ids)
  if (!report) return
  try {
    await storeReport(db, report, await render(report.input, { signal: stopping }))
  } catch (error) {
    if (stopping.aborted) return handBackReport(db, report)
    if (error instanceof DomainError) {
      await failReport(db, report, error.message)
      return
    }
    if (last)
      await failReport(db, report, 'The report could not be rendered because of an error here: ask for it again.')
    throw error
  }
}
