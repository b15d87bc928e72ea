import type { CaseResult } from '../engine/case-result'
import type { StudyResult } from '../engine/study-run'

/** A case's result without its curves. */
export type CaseSummary = Omit<CaseResult, 'series'>

/** Everything a list, a table or a verdict needs, at full precision; the curves of each case are kept apart. */
export interface StudySummary extends Omit<StudyResult, 'cases'> {
  cases: readonly CaseSummary[]
}

/** A case's result with its curves left off. */
export const summariseCase = ({ series: _, ...summary }: CaseResult): CaseSummary => summary

/** A study's result with the curves of all cases left off. */
export const summarise = (result: StudyResult): StudySummary => ({
  ...result,
  cases: result.cases.map(summariseCase),
})
