import { runCase } from '../engine/run-case'
import { reducedCase } from '../report/hand-check/reduced-case'
import { renderReport } from '../report/render-report'
import type { HandCheckResult, ReportInput } from '../report/report-input'
import type { StudyDocument } from '../study/document/study-document'
import { studyRunInput } from '../study/to-engine/study-run-input'

/** The tool's own figure for the hand check: the first start of the first case with everything else off. */
function handCheckOf(document: StudyDocument): HandCheckResult | null {
  for (const input of studyRunInput(document).cases) {
    for (const { id } of input.motors) {
      const reduced = reducedCase(input, id)
      if (reduced) return { caseId: input.id, motorId: id, result: runCase(reduced) }
    }
  }
  return null
}

/** The task of a rendering thread: the PDF of a report as bytes. */
export async function render(input: ReportInput): Promise<Uint8Array> {
  return renderReport({ ...input, handCheck: handCheckOf(input.document) })
}
