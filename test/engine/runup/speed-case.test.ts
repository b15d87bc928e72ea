import { describe, expect, it } from 'vitest'
import { speedCase } from '@/lib/cli/speed-case'
import { runCase } from '@/lib/engine/run-case'

describe('the case on which run-ups are timed', () => {
  it('reaches 98 % of 1487 r/min in 5.752078 s', () => {
    expect(runCase(speedCase()).motors[0]!.start!.timeToCriterion).toBeCloseTo(5.752078, 6)
  })

  it('takes some dozens of steps, and a few hundred solutions of the network', () => {
    const { counters } = runCase(speedCase())
    expect(counters.steps).toBeLessThan(80)
    expect(counters.evaluations).toBeLessThan(500)
    expect(counters.networkIterations / counters.evaluations).toBeLessThan(4)
  })

  it('with two running motors beside it is slower by their share of the voltage', () => {
    const result = runCase(speedCase(2))
    expect(result.motors).toHaveLength(3)
    expect(result.motors[0]!.start!.timeToCriterion!).toBeGreaterThan(5.76)
    expect(result.motors[1]!.running!.outcome.kind).toBe('rode-through')
    expect(result.motors[1]!.running!.lowestSpeed.speed).toBeLessThan(result.motors[1]!.running!.before.speed)
  })
})
