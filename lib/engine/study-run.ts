import type { CaseInput } from './case-input'
import type { CaseResult } from './case-result'
import type { CloseMargins, RuleInput, StartFrequency, Verdict, VerdictWord } from './criteria/rule'

/** All cases and limits of a study as the engine sees them. */
export interface StudyRunInput {
  cases: readonly CaseInput[]
  rules: readonly RuleInput[]
  starts: StartFrequency
  margins: CloseMargins
}

export interface StudyResult {
  engineVersion: string
  cases: readonly CaseResult[]
  verdicts: readonly Verdict[]
  overall: StudyVerdict
}

/** The whole meets only if every applicable limit was assessed. `governing` is the row with the least margin, counted in bands of `close`. */
export interface StudyVerdict {
  word: VerdictWord
  governing: Verdict | null
  counts: Record<VerdictWord, number>
}
