import type { StudyVerdict } from '../study-run'
import type { Verdict, VerdictWord } from './rule'

/** Margin in parts of the limit; a limit that nothing reached counts as missed without end. */
function relativeMargin(verdict: Verdict): number {
  if (verdict.margin === null) return verdict.word === 'fails' ? Number.NEGATIVE_INFINITY : Number.POSITIVE_INFINITY
  return verdict.margin / Math.abs(verdict.limit)
}

/**
 * The verdict on the whole: fails if any limit in use fails, meets (or is close) only if every limit in use was
 * assessed. Nothing to assess is not assessed. The governing row is the one with the least margin in parts of its limit.
 */
export function overallVerdict(verdicts: readonly Verdict[]): StudyVerdict {
  const counting = verdicts.filter((verdict) => verdict.inUse)
  const counts: Record<VerdictWord, number> = { meets: 0, close: 0, fails: 0, 'not-assessed': 0 }
  for (const verdict of counting) counts[verdict.word]++
  const governing = counting
    .filter((verdict) => verdict.word !== 'not-assessed')
    .reduce<Verdict | null>(
      (least, verdict) => (least === null || relativeMargin(verdict) < relativeMargin(least) ? verdict : least),
      null,
    )
  return { word: overallWord(counts), governing, counts }
}

function overallWord(counts: Record<VerdictWord, number>): VerdictWord {
  if (counts.fails > 0) return 'fails'
  if (counts['not-assessed'] > 0 || counts.meets + counts.close === 0) return 'not-assessed'
  return counts.close > 0 ? 'close' : 'meets'
}
