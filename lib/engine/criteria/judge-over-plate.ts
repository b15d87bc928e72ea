import type { CaseInput } from '../case-input'
import type { CaseResult } from '../case-result'
import { judge, wordFor } from './judge'
import type { CloseMargins, RuleInput, StartFrequency, Verdict, VerdictWord } from './rule'

const noCurves = { time: [], busVoltage: {}, motors: {} }

const weight: Record<VerdictWord, number> = { fails: 0, 'not-assessed': 1, close: 2, meets: 3 }

/** The worse first; among equals the one with less margin, a limit that nothing reached having least. */
const byWorse = (a: Verdict, b: Verdict): number =>
  weight[a.word] - weight[b.word] ||
  (a.margin ?? Number.NEGATIVE_INFINITY) - (b.margin ?? Number.NEGATIVE_INFINITY) ||
  0

/**
 * Holds one rule against a case and against all its machines that meet the same plates; the worst speaks.
 *
 * Of the others no curves are kept: their worst points under each envelope, and their flicker, were found when they ran.
 */
export function judgeOverPlate(
  rule: RuleInput,
  input: CaseInput,
  result: CaseResult,
  starts: StartFrequency,
  margins: CloseMargins,
): Verdict | null {
  const steady = judge(rule, input, result, starts, margins)
  const third = (result.variants ?? []).find(({ kind }) => kind === 'third-order')
  const points = third?.envelopes?.find(({ ruleId }) => ruleId === rule.id)?.points
  const held = third !== undefined && (rule.limit.kind !== 'envelope' || points !== undefined)
  const moving = held ? judge(rule, input, { ...third.result, series: noCurves }, starts, margins, points) : null
  /** What only a transient model may judge has its word from the third-order run, or from a quasi-static figure that is worse. */
  const assessed = (verdict: Verdict): Verdict => {
    if (verdict.reason !== 'transient-only' || moving === null) return verdict
    if (moving.margin === null || verdict.margin === null || moving.margin <= verdict.margin) return moving
    return { ...verdict, word: wordFor(rule, verdict.margin, verdict.limit, margins), reason: null }
  }
  const own = steady === null ? null : assessed(steady)
  const others = (result.variants ?? []).filter(({ kind }) => kind === 'same-plate')
  if (own === null || others.length === 0) return own
  const all = others.flatMap(({ result: other, envelopes }) => {
    const kept = envelopes?.find(({ ruleId }) => ruleId === rule.id)?.points
    // An envelope that was not looked at when the others ran is held against the case alone.
    if (rule.limit.kind === 'envelope' && kept === undefined && other.outcome.kind === 'complete') return []
    const verdict = judge(rule, input, { ...other, series: noCurves }, starts, margins, kept)
    return verdict === null ? [] : [assessed(verdict)]
  })
  const worst = [own, ...all].reduce((least, each) => (byWorse(each, least) < 0 ? each : least))
  return all.length === 0 ? own : { ...worst, circuits: 1 + all.length }
}
