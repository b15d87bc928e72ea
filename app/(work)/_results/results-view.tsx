import type { CaseSeries } from '@/lib/engine/case-result'
import { AnswerStrip } from './answer-strip'
import { CaseDetail } from './case-detail'
import { CaseOverview } from './case-overview'
import { Cautions } from './cautions'
import { EstimatedCircuits } from './estimated-circuits'
import { LimitsMatrix } from './limits-matrix'
import type { Results } from './results'

interface ResultsViewProps {
  results: Results
  caseId: string
  series: CaseSeries | null
}

/** Results of a study in work or of a frozen revision: the answer, the limits, all cases, and one case in full. */
export function ResultsView({ results, caseId, series }: ResultsViewProps) {
  return (
    <>
      <AnswerStrip results={results} />
      <LimitsMatrix results={results} />
      <CaseOverview results={results} chosen={caseId} />
      <CaseDetail results={results} caseId={caseId} series={series} />
      <EstimatedCircuits document={results.document} />
      <Cautions document={results.document} />
    </>
  )
}

/** The case to open: the one asked for, else the one that governs, else the first. */
export const caseToOpen = ({ document, summary }: Results, asked: string | string[] | undefined): string =>
  document.cases.find(({ id }) => id === asked)?.id ??
  document.cases.find(({ id }) => id === summary.overall.governing?.caseId)?.id ??
  document.cases[0]?.id ??
  ''
