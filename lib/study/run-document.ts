import { computeCases, judgeStudy } from '../engine/run-study'
import type { StudyResult } from '../engine/study-run'
import type { StudyDocument } from './document/study-document'
import { studyVerdict } from './study-verdict'
import { studyRunInput } from './to-engine/study-run-input'

/** Hears after each case how many are done. */
export type ProgressListener = (done: number, of: number) => void

/**
 * Computes a study document: every case, every limit, and the verdict over its design cases. A document that does not
 * fit together is refused as `studyRunInput` says; every numerical outcome is a result.
 */
export const runDocument = (document: StudyDocument, onProgress?: ProgressListener): StudyResult => {
  const input = studyRunInput(document)
  const results = []
  for (const result of computeCases(input)) {
    results.push(result)
    onProgress?.(results.length, input.cases.length)
  }
  const judged = judgeStudy(input, results)
  return { ...judged, overall: studyVerdict(document, input, judged.verdicts) }
}
