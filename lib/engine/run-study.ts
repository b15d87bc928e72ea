import type { CaseResult } from './case-result'
import { judgeOverPlate } from './criteria/judge-over-plate'
import { overallVerdict } from './criteria/overall'
import type { Verdict } from './criteria/rule'
import { runWithVariants } from './run-variants'
import type { StudyResult, StudyRunInput } from './study-run'
import { ENGINE_VERSION } from './version'

/** Computes every case of a study and holds the limits against them; `onProgress` hears of each finished case. */
export function runStudy(input: StudyRunInput, onProgress?: (done: number, of: number) => void): StudyResult {
  const results: CaseResult[] = []
  for (const result of computeCases(input)) {
    results.push(result)
    onProgress?.(results.length, input.cases.length)
  }
  return judgeStudy(input, results)
}

/** Computes cases one after the other, so that a caller can stop, report or yield between them. */
export function* computeCases({ cases, rules }: StudyRunInput): Generator<CaseResult, void, undefined> {
  for (const each of cases) yield runWithVariants(each, rules)
}

/** Holds the limits of a study against cases already computed, in the order of its cases. */
export function judgeStudy(input: StudyRunInput, results: readonly CaseResult[]): StudyResult {
  const verdicts = input.rules.flatMap((rule) =>
    input.cases.flatMap((each, index): Verdict[] => {
      const verdict = judgeOverPlate(rule, each, results[index]!, input.starts, input.margins)
      return verdict === null ? [] : [verdict]
    }),
  )
  return {
    engineVersion: ENGINE_VERSION,
    cases: results,
    verdicts,
    overall: overallVerdict(verdicts, input.rules, input.margins),
  }
}
