import { describe, expect, test } from 'vitest'
import { plainRunUp } from '@/lib/cli/plain-run-up'
import { speedCase } from '@/lib/cli/speed-case'
import { runCase } from '@/lib/engine/run-case'

/** Converged time to 98 % of 1487 r/min by two independent formulations. */
const converged = 5.752078

describe('the case that run-ups are timed on', () => {
  test('the engine reaches 98 % of rated speed at 5.752078 s', () => {
    expect(runCase(speedCase()).motors[0]!.start!.timeToCriterion).toBeCloseTo(converged, 5)
  })

  test('the loop written out by hand computes the same machine and network', () => {
    expect(plainRunUp(speedCase(), 2000, 10)).toBeCloseTo(converged, 4)
    expect(plainRunUp(speedCase(), 200_000, 10)).toBeCloseTo(converged, 6)
  })

  test('a loop that ends too early has no instant', () => {
    expect(plainRunUp(speedCase(), 100, 1)).toBeNaN()
  })

  test('two running motors deepen the start and lengthen it', () => {
    const start = runCase(speedCase(2)).motors[0]!.start!
    expect(start.outcome.kind).toBe('started')
    expect(start.timeToCriterion).toBeGreaterThan(converged)
  })
})
