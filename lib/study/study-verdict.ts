import { overallVerdict } from '../engine/criteria/overall'
import type { Verdict } from '../engine/criteria/rule'
import type { StudyRunInput, StudyVerdict } from '../engine/study-run'
import type { StudyDocument } from './document/study-document'

/** Identities of the cases that count in the verdict of the whole. */
export const designCases = ({ cases }: StudyDocument): ReadonlySet<string> =>
  new Set(cases.filter(({ role }) => role === 'design').map(({ id }) => id))

/**
 * The verdict of the whole study: over the design cases and the limits in use. Sensitivities and comparisons are shown
 * beside it: a method that was only compared, and fails, does not make the proposed one fail.
 */
export const studyVerdict = (
  document: StudyDocument,
  { rules, margins }: StudyRunInput,
  verdicts: readonly Verdict[],
): StudyVerdict => {
  const counted = designCases(document)
  return overallVerdict(
    verdicts.filter(({ caseId }) => counted.has(caseId)),
    rules,
    margins,
  )
}
