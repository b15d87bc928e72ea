import { describe, expect, it } from 'vitest'
import type { CaseResult } from '@/lib/engine/case-result'
import { marginOf, worstUnderEnvelope } from '@/lib/engine/criteria/envelope'
import { judge } from '@/lib/engine/criteria/judge'
import { perUnit, second, volt } from '@/lib/units/si'
import { limitOn, tried, triedResult } from '../../support/made-result'

/** The tried case with a voltage of our own making: 100 V nominal, 100 V before, switched on at t = 0. */
function withCourse(time: number[], voltage: number[], settled: number | null): CaseResult {
  const place = {
    ...triedResult.places[0]!,
    nominal: volt(100),
    before: volt(100),
    settledAfterStart: settled === null ? null : volt(settled),
  }
  return { ...triedResult, places: [place], series: { ...triedResult.series, time, busVoltage: { B: voltage } } }
}

const envelope = (...steps: [from: number, value: number][]) => ({
  kind: 'envelope' as const,
  steps: steps.map(([from, value]) => ({ from: second(from), value: perUnit(value) })),
})

const worst = (result: CaseResult, limit: ReturnType<typeof envelope>, changes = {}) =>
  worstUnderEnvelope(limitOn({ limit, ...changes }), limit, tried, result, {
    place: result.places[0]!,
    motor: null,
    result: null,
  })!

describe('an envelope of change against duration', () => {
  it('is held against the run from the first switching-on, the sample before it left out', () => {
    // At t = 0 both 50 (before our switching would have it) and 92 stand: the later one counts.
    const result = withCourse([0, 0, 1, 4], [50, 92, 96, 99], 99)
    expect(worst(result, envelope([0, 0.1]))).toMatchObject({ value: 0.08, at: 0, limit: 0.1 })
  })

  it('finds the step whose limit is passed farthest in its own parts', () => {
    const result = withCourse([0, 0, 1, 2, 5, 10], [100, 91, 94, 96, 96, 99], 99)
    // 9 % of 10 %, then 6 % of 6 % at 1 s, then 4 % of 3 % from 2 s on.
    const point = worst(result, envelope([0, 0.1], [1, 0.06], [2, 0.03]))
    expect(point.value).toBeCloseTo(0.04, 12)
    expect(point.limit).toBe(0.03)
  })

  it('looks at the instant of a step between samples', () => {
    const result = withCourse([0, 0, 4], [100, 92, 100], 100)
    // At 2 s the straight line is at 96: 4 % against 3 %.
    const point = worst(result, envelope([0, 0.09], [2, 0.03]))
    expect(point).toMatchObject({ at: 2, limit: 0.03 })
    expect(point.value).toBeCloseTo(0.04, 12)
  })

  it('goes on with the settled voltage after the run', () => {
    const result = withCourse([0, 0, 4], [100, 92, 98], 98)
    const point = worst(result, envelope([0, 0.2], [60, 0.01]))
    expect(point).toMatchObject({ value: 0.02, at: 60, limit: 0.01 })
  })

  it('without a settled state goes on with the last voltage', () => {
    expect(worst(withCourse([0, 0, 4], [100, 92, 97], null), envelope([0, 0.2], [60, 0.01])).value).toBeCloseTo(
      0.03,
      12,
    )
  })

  it('does not limit what lies before its first step', () => {
    const result = withCourse([0, 0, 1, 4], [100, 60, 99, 99], 99)
    expect(worst(result, envelope([1, 0.05])).value).toBeCloseTo(0.01, 12)
  })

  it('may hold what must remain instead', () => {
    const result = withCourse([0, 0, 1, 4], [100, 80, 90, 95], 95)
    const point = worst(result, envelope([0, 0.7], [1, 0.92]), { quantity: 'remaining-voltage', reference: 'nominal' })
    expect(point.value).toBeCloseTo(0.9, 12)
    expect(point.limit).toBe(0.92)
  })

  it('gives a verdict with the limit in force at the worst instant', () => {
    const result = withCourse([0, 0, 4], [100, 92, 100], 100)
    const margins = { ofLimit: perUnit(0.1), voltage: perUnit(0.01) }
    const rule = limitOn({ limit: envelope([0, 0.09], [2, 0.03]) })
    const verdict = judge(rule, tried, result, { perDay: 1, perHour: 1 }, margins)!
    expect(verdict).toMatchObject({ word: 'fails', limit: 0.03, at: 2, busId: 'B' })
    expect(verdict.margin).toBeCloseTo(-0.01, 12)
  })

  it('without steps is not assessed', () => {
    const margins = { ofLimit: perUnit(0.1), voltage: perUnit(0.01) }
    const verdict = judge(limitOn({ limit: envelope() }), tried, triedResult, { perDay: 1, perHour: 1 }, margins)!
    expect(verdict.word).toBe('not-assessed')
  })
})

describe('a margin', () => {
  it('is positive inside the limit, for least as for largest values', () => {
    expect(marginOf(limitOn(), 0.03, 0.04)).toBeCloseTo(0.01, 12)
    expect(marginOf(limitOn({ quantity: 'remaining-voltage' }), 0.9, 0.8)).toBeCloseTo(0.1, 12)
    expect(marginOf(limitOn({ quantity: 'accelerating-torque' }), 0.05, 0.1)).toBeCloseTo(-0.05, 12)
    expect(marginOf(limitOn({ quantity: 'highest-voltage' }), 1.05, 1.1)).toBeCloseTo(0.05, 12)
  })
})
