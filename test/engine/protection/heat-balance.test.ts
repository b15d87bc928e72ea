import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { heatBalances } from '@/lib/engine/protection/heat-balance'
import type { ThermalData } from '@/lib/engine/protection-input'
import { second } from '@/lib/units/si'

const thermal: ThermalData = {
  cold: second(20),
  hot: second(12),
  limits: [],
  coolingRunning: second(1800),
  coolingStopped: second(5400),
}
const start = (used: number, rest = 0) => ({ used, lasts: 10, rest, complete: true })

describe('heat of starts one after the other', () => {
  it('begins at ambient from cold and at 1 − t_hot/t_cold from hot, on one scale', () => {
    const [cold] = heatBalances(thermal, 'cold', [start(0.3)])!
    expect(cold).toMatchObject({ before: 0, after: 0.3 })
    const [hot] = heatBalances(thermal, 'hot', [start(0.5)])!
    expect(hot!.running).toBeCloseTo(0.4, 12)
    // Half of what is left from hot: 0.4 + 0.5·(12/20).
    expect(hot!.after).toBeCloseTo(0.7, 12)
  })

  it('carries over a rest what the constant of standstill leaves, and all of it where that is unknown', () => {
    const starts = [start(0.3, 5400), start(0.3)]
    expect(heatBalances(thermal, 'cold', starts)![1]!.before).toBeCloseTo(0.3 / Math.E, 12)
    const unknown = { ...thermal, coolingStopped: null }
    expect(heatBalances(unknown, 'cold', starts)![1]!.before).toBeCloseTo(0.3, 12)
  })

  it('counts the starts in succession that fit from cold and from hot', () => {
    const [one] = heatBalances(thermal, 'cold', [start(0.3)])!
    expect(one!.inSuccession).toEqual({ cold: 3, hot: 2 })
    const [tooHot] = heatBalances(thermal, 'cold', [start(0.7)])!
    expect(tooHot!.inSuccession).toEqual({ cold: 1, hot: 0 })
  })

  it('gives the rest after which the same start fits exactly', () => {
    const [one] = heatBalances(thermal, 'cold', [start(0.7)])!
    const rest = one!.restBeforeNext!
    const [, second_] = heatBalances(thermal, 'cold', [start(0.7, rest), start(0.7)])!
    expect(second_!.after).toBeCloseTo(1, 9)
    expect(heatBalances(thermal, 'cold', [start(1.2)])![0]!.restBeforeNext).toBeNull()
  })

  it('says nothing about more starts where this one did not get there', () => {
    const [one] = heatBalances(thermal, 'cold', [{ ...start(0.3), complete: false }])!
    expect(one).toMatchObject({ after: 0.3, inSuccession: null, restBeforeNext: null, perHour: null })
  })

  it('says nothing without the permissible time of its state, and no number an hour without cooling', () => {
    expect(heatBalances({ ...thermal, cold: null }, 'cold', [start(0.3)])).toBeNull()
    const still = { ...thermal, coolingRunning: null, coolingStopped: null }
    expect(heatBalances(still, 'cold', [start(0.3)])![0]!.perHour).toBeNull()
  })

  it('allows a number an hour that a simulated day of starts confirms, and not one more', () => {
    const onlyStopped = { ...thermal, coolingRunning: null }
    const { perHour } = heatBalances(onlyStopped, 'cold', [start(0.3)])![0]!
    const hottest = (an_hour: number): number => {
      const rest = 3600 / an_hour - 10
      const day = Array.from({ length: 24 * an_hour }, () => start(0.3, rest))
      return Math.max(...heatBalances(onlyStopped, 'cold', day)!.map(({ after }) => after))
    }
    expect(perHour).toBeGreaterThan(0)
    expect(hottest(perHour!)).toBeLessThanOrEqual(1 + 1e-9)
    expect(hottest(perHour! + 1)).toBeGreaterThan(1)
  })

  it('allows no more starts when a start brings more heat or cooling is slower', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.05, max: 0.9, noNaN: true }),
        fc.double({ min: 1, max: 3, noNaN: true }),
        (used, factor) => {
          const count = (data: ThermalData, heat: number) => heatBalances(data, 'cold', [start(heat)])![0]!.perHour!
          const own = count(thermal, used)
          expect(count(thermal, used * factor)).toBeLessThanOrEqual(own)
          const slower = { ...thermal, coolingStopped: second(5400 * factor), coolingRunning: second(1800 * factor) }
          expect(count(slower, used)).toBeLessThanOrEqual(own)
        },
      ),
      { seed: 7 },
    )
  })
})
