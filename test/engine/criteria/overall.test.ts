import { describe, expect, it } from 'vitest'
import { overallVerdict } from '@/lib/engine/criteria/overall'
import type { RuleInput, Verdict, VerdictWord } from '@/lib/engine/criteria/rule'
import { perUnit } from '@/lib/units/si'
import { limitOn } from '../../support/made-result'

const margins = { ofLimit: perUnit(0.1), voltage: perUnit(0.01) }

const verdict = (word: VerdictWord, changes: Partial<Verdict> = {}): Verdict => ({
  ruleId: 'change',
  caseId: 'C1',
  word,
  reason: null,
  inUse: true,
  value: 0.03,
  limit: 0.04,
  margin: 0.01,
  busId: 'B',
  motorId: null,
  at: null,
  ...changes,
})

const rules: RuleInput[] = [limitOn({ id: 'change' }), limitOn({ id: 'remaining', quantity: 'remaining-voltage' })]
const whole = (...verdicts: Verdict[]) => overallVerdict(verdicts, rules, margins)

describe('the verdict on the whole', () => {
  it('fails if any limit in use fails', () => {
    expect(whole(verdict('meets'), verdict('fails', { margin: -0.01 }), verdict('not-assessed')).word).toBe('fails')
  })

  it('is not assessed while any limit in use is not', () => {
    expect(whole(verdict('meets'), verdict('not-assessed', { margin: null })).word).toBe('not-assessed')
  })

  it('is close when one is close, and meets when all meet', () => {
    expect(whole(verdict('meets'), verdict('close')).word).toBe('close')
    expect(whole(verdict('meets'), verdict('meets')).word).toBe('meets')
  })

  it('is not assessed when there is nothing to assess', () => {
    expect(whole().word).toBe('not-assessed')
    expect(whole().governing).toBeNull()
    expect(whole(verdict('meets', { inUse: false })).word).toBe('not-assessed')
  })

  it('counts rows in use only', () => {
    const { counts, word } = whole(verdict('meets'), verdict('close'), verdict('fails', { inUse: false, margin: -1 }))
    expect(counts).toEqual({ meets: 1, close: 1, fails: 0, 'not-assessed': 0 })
    expect(word).toBe('close')
  })

  it('names the row with the least margin in bands of close', () => {
    // 0.01 of 0.04 is 2.5 bands of 0.004; 0.02 pu of remaining voltage is 2 bands of 0.01.
    const remaining = verdict('meets', { ruleId: 'remaining', value: 0.82, limit: 0.8, margin: 0.02 })
    expect(whole(verdict('meets'), remaining).governing).toBe(remaining)
    const tighter = verdict('close', { margin: 0.002 })
    expect(whole(remaining, tighter).governing).toBe(tighter)
  })

  it('names a limit that was missed without a figure before all others', () => {
    const missed = verdict('fails', { margin: null, value: null })
    expect(whole(verdict('fails', { margin: -5 }), missed).governing).toBe(missed)
  })

  it('does not name a row that was not assessed or is not in use', () => {
    const meets = verdict('meets')
    const governing = whole(
      verdict('not-assessed', { margin: null }),
      verdict('fails', { inUse: false, margin: -1 }),
      meets,
    ).governing
    expect(governing).toBe(meets)
  })

  it('falls back on parts of the limit where close has no width', () => {
    const none = { ofLimit: perUnit(0), voltage: perUnit(0) }
    const [a, b] = [verdict('meets', { margin: 0.01 }), verdict('meets', { margin: 0.02 })]
    expect(overallVerdict([b, a], rules, none).governing).toBe(a)
  })
})
