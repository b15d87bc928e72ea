import { describe, expect, it } from 'vitest'
import { createIntegrator, type Derivative } from '@/lib/engine/numeric/dormand-prince'

const oscillator: Derivative = (_t, y, dy) => {
  dy[0] = y[1]!
  dy[1] = -y[0]!
  return true
}

const scalar =
  (rate: (t: number, y: number) => number): Derivative =>
  (t, y, dy) => {
    dy[0] = rate(t, y[0]!)
    return true
  }

/** Runs to `until` and returns the end state with the number of steps. */
function run(derivative: Derivative, start: number[], until: number, tolerance: number, longest = 10) {
  const state = Float64Array.from(start)
  const scale = new Float64Array(start.length).fill(tolerance)
  const integrator = createIntegrator(state, derivative, scale, longest)
  integrator.restart(0, 0)
  while (integrator.time < until) expect(integrator.advance(until)).toBe('accepted')
  return integrator
}

/** Error at t = 2 of the growth y' = y when every step is `h` long (no error control: the tolerance is wide). */
function errorWithStep(h: number): number {
  const state = Float64Array.of(1)
  const integrator = createIntegrator(
    state,
    scalar((_t, y) => y),
    Float64Array.of(1e9),
    h,
  )
  integrator.restart(0, h)
  while (integrator.time < 2 - 1e-12) integrator.advance(2)
  return Math.abs(state[0]! - Math.exp(2))
}

describe('the integrator', () => {
  it('is of fifth order: half the step, a thirty-second of the error', () => {
    const errors = [0.2, 0.1, 0.05, 0.025].map(errorWithStep)
    for (let i = 1; i < errors.length; i++) {
      const order = Math.log2(errors[i - 1]! / errors[i]!)
      expect(order).toBeGreaterThan(4.7)
      expect(order).toBeLessThan(5.4)
    }
  })

  it('has a dense output of fourth order', () => {
    const worst = [0.4, 0.2, 0.1].map((h) => {
      const state = Float64Array.of(0, 1)
      const integrator = createIntegrator(state, oscillator, Float64Array.of(1e9, 1e9), h)
      integrator.restart(0, h)
      const between = new Float64Array(2)
      let largest = 0
      while (integrator.time < 2 - 1e-12) {
        integrator.advance(2)
        for (let part = 0.1; part < 1; part += 0.1) {
          const t = integrator.from + part * (integrator.time - integrator.from)
          integrator.interpolate(t, between)
          largest = Math.max(largest, Math.abs(between[0]! - Math.sin(t)))
        }
      }
      return largest
    })
    expect(Math.log2(worst[0]! / worst[1]!)).toBeGreaterThan(3.7)
    expect(Math.log2(worst[1]! / worst[2]!)).toBeGreaterThan(3.7)
  })

  it('is exact for polynomials in time up to the fifth degree', () => {
    const integrator = run(
      scalar((t) => 5 * t ** 4 - 4 * t ** 3 + 1),
      [0],
      2,
      1e3,
      0.5,
    )
    expect(integrator.state[0]).toBeCloseTo(2 ** 5 - 2 ** 4 + 2, 8)
  })

  it('follows its tolerance: a hundred times tighter, about a hundred times closer', () => {
    const errors = [1e-4, 1e-6, 1e-8, 1e-10].map((tolerance) => {
      const { state } = run(oscillator, [0, 1], 20, tolerance)
      return Math.hypot(state[0]! - Math.sin(20), state[1]! - Math.cos(20))
    })
    for (let i = 1; i < errors.length; i++) {
      expect(errors[i]!).toBeLessThan(errors[i - 1]! / 20)
    }
    expect(errors[3]!).toBeLessThan(1e-8)
  })

  it('ends exactly where it is told to', () => {
    const integrator = run(oscillator, [0, 1], 1.2345, 1e-6)
    expect(integrator.time).toBe(1.2345)
  })

  it('takes the steps that a stiff decay allows and stays calm at the limit', () => {
    const decay = scalar((t, y) => -200 * (y - Math.cos(t)))
    const integrator = run(decay, [1], 10, 1e-4)
    expect(integrator.state[0]).toBeCloseTo(Math.cos(10) * 1 + Math.sin(10) / 200, 3)
    // The stability limit of the pair is 3.3 time constants.
    expect(integrator.counters.steps).toBeLessThan((10 * 200) / 2.4)
    expect(integrator.counters.rejected).toBeLessThan(0.05 * integrator.counters.steps)
  })

  it('counts steps, rejections and evaluations', () => {
    const { counters } = run(oscillator, [0, 1], 20, 1e-8)
    // One evaluation at the start, one for the first step size, six a tried step.
    expect(counters.evaluations).toBe(2 + 6 * (counters.steps + counters.rejected))
    expect(counters.largestErrorRatio).toBeGreaterThan(0)
    expect(counters.largestErrorRatio).toBeLessThanOrEqual(1)
  })

  it('can be cut inside the last step and goes on from there', () => {
    const state = Float64Array.of(0, 1)
    const integrator = createIntegrator(state, oscillator, Float64Array.of(1e-9, 1e-9), 1)
    integrator.restart(0, 0)
    while (integrator.time < 1) integrator.advance(3)
    const middle = (integrator.from + integrator.time) / 2
    integrator.cutAt(middle)
    expect(integrator.time).toBe(middle)
    expect(state[0]).toBeCloseTo(Math.sin(middle), 8)
    integrator.restart(middle, integrator.nextStep)
    while (integrator.time < 3) integrator.advance(3)
    expect(state[0]).toBeCloseTo(Math.sin(3), 7)
  })

  it('remembers the step before the last for interpolation', () => {
    const state = Float64Array.of(0, 1)
    const integrator = createIntegrator(state, oscillator, Float64Array.of(1e-9, 1e-9), 1)
    integrator.restart(0, 0)
    for (let i = 0; i < 5; i++) integrator.advance(5)
    const begin = integrator.from
    integrator.advance(5)
    const between = new Float64Array(2)
    const t = (begin + integrator.from) / 2
    integrator.interpolate(t, between)
    expect(between[0]).toBeCloseTo(Math.sin(t), 8)
  })

  it('shortens its steps where the function has no value and stops at the wall', () => {
    // y' = 1, defined up to y = 1 only.
    const walled: Derivative = (_t, y, dy) => {
      dy[0] = 1
      return y[0]! <= 1
    }
    const state = Float64Array.of(0)
    const integrator = createIntegrator(state, walled, Float64Array.of(1e-6), 1)
    integrator.restart(0, 0.3)
    let outcome = integrator.advance(5)
    for (let i = 0; i < 500 && outcome === 'accepted'; i++) outcome = integrator.advance(5)
    expect(outcome).toBe('blocked')
    expect(integrator.time).toBeCloseTo(1, 6)
    expect(integrator.restart(1.1, 0)).toBe(true)
  })

  it('does not begin where the function has no value', () => {
    const integrator = createIntegrator(Float64Array.of(0), () => false, Float64Array.of(1), 1)
    expect(integrator.restart(0, 0)).toBe(false)
  })

  it('starts with a long step where nothing moves', () => {
    const integrator = createIntegrator(
      Float64Array.of(1),
      scalar(() => 0),
      Float64Array.of(1e-8),
      1,
    )
    integrator.restart(0, 0)
    let steps = 0
    while (integrator.time < 60) {
      integrator.advance(60)
      steps++
    }
    expect(steps).toBeLessThan(70)
  })
})
