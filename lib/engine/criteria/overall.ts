import type { StudyVerdict } from '../study-run'
import { closeBand } from './judge'
import type { CloseMargins, RuleInput, Verdict, VerdictWord } from './rule'

/**
 * The verdict on the whole: fails if any limit in use fails, meets (or is close) only if every limit in use was
 * assessed. Nothing to assess is not assessed.
 *
 * The governing row has the least margin counted in bands of `close`: a hundredth of a per unit on a remaining voltage
 * and a tenth of a limit on change, time, torque or heat weigh the same, where parts of the limit would let every
 * voltage limit (0.95 against 0.90) look tighter than a change at its limit.
 */
export function overallVerdict(
  verdicts: readonly Verdict[],
  rules: readonly RuleInput[],
  margins: CloseMargins,
): StudyVerdict {
  const counting = verdicts.filter((verdict) => verdict.inUse)
  const counts: Record<VerdictWord, number> = { meets: 0, close: 0, fails: 0, 'not-assessed': 0 }
  for (const verdict of counting) counts[verdict.word]++
  const bands = (verdict: Verdict): number => {
    // A limit that nothing reached counts as missed without end.
    if (verdict.margin === null) return Number.NEGATIVE_INFINITY
    const rule = rules.find(({ id }) => id === verdict.ruleId)
    const band = rule ? closeBand(rule, verdict.limit, margins) : 0
    return verdict.margin / (band > 0 ? band : Math.abs(verdict.limit))
  }
  const governing = counting
    .filter((verdict) => verdict.word !== 'not-assessed')
    .reduce<Verdict | null>(
      (least, verdict) => (least === null || bands(verdict) < bands(least) ? verdict : least),
      null,
    )
  return { word: overallWord(counts), governing, counts }
}

function overallWord(counts: Record<VerdictWord, number>): VerdictWord {
  if (counts.fails > 0) return 'fails'
  if (counts['not-assessed'] > 0 || counts.meets + counts.close === 0) return 'not-assessed'
  return counts.close > 0 ? 'close' : 'meets'
}
