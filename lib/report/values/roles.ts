import type { CaseResult } from '@/lib/engine/case-result'
import type { CaseRecord } from '@/lib/study/document/case-records'
import type { ReportInput } from '../report-input'

export const roles = ['design', 'comparison', 'sensitivity'] as const

/** A case of the study with its result; null where it was not computed. */
export interface CaseRun {
  record: CaseRecord
  result: CaseResult | null
}

/** The cases of some roles in the order of the study. */
export const runsOf = ({ document, result }: ReportInput, wanted: readonly CaseRecord['role'][]): readonly CaseRun[] =>
  document.cases
    .filter((record) => wanted.includes(record.role))
    .map((record) => ({ record, result: result.cases.find(({ caseId }) => caseId === record.id) ?? null }))

/** Runs that have figures. */
export const computedRuns = (runs: readonly CaseRun[]) =>
  runs.flatMap(({ record, result }) => (result ? [{ record, result }] : []))
