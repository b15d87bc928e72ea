import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { createExtremeSearch, watch } from '@/lib/engine/runup/extremes'

/** A run of known course: channel 0 and 1 of an observation as functions of time. */
function searchOver(course: (t: number) => [number, number], watches: ReturnType<typeof watch>[]) {
  let looks = 0
  const search = createExtremeSearch(watches, 2, (t, into) => {
    looks++
    into.set(course(t))
    return true
  })
  return {
    at: (t: number) => search.add(t, Float64Array.from(course(t))),
    breakHere: () => search.breakHere(),
    looks: () => looks,
  }
}

describe('the extremes of a run', () => {
  it('are found between the points', () => {
    fc.assert(
      fc.property(fc.integer({ min: 150, max: 850 }), (thousandth) => {
        const bottom = thousandth / 1000
        const least = watch(0, 1, true)
        const run = searchOver((t) => [1 + (t - bottom) ** 2 + 0.3 * (t - bottom) ** 3, 0], [least])
        for (let t = 0; t <= 1.0001; t += 0.1) run.at(t)
        expect(least.value).toBeCloseTo(1, 9)
        expect(least.at).toBeCloseTo(bottom, 3)
      }),
    )
  })

  it('are the largest values where these are wanted', () => {
    const most = watch(1, -1, true)
    const run = searchOver((t) => [0, Math.sin(t)], [most])
    for (let t = 0; t <= 3.01; t += 0.25) run.at(t)
    expect(most.value).toBeCloseTo(1, 8)
    expect(most.at).toBeCloseTo(Math.PI / 2, 3)
  })

  it('lie at the ends where the quantity goes one way only', () => {
    const [least, most] = [watch(0, 1, true), watch(0, -1, true)]
    const run = searchOver((t) => [Math.exp(t), 0], [least, most])
    for (const t of [0, 0.4, 1]) run.at(t)
    expect([least.value, least.at]).toEqual([1, 0])
    expect([most.value, most.at]).toEqual([Math.exp(1), 1])
    expect(run.looks()).toBe(0)
  })

  it('are not sought across a switching', () => {
    const least = watch(0, 1, true)
    // Falls to 0.5 at t = 1, jumps to 0.6 and rises: the least value is the one before the jump.
    const run = searchOver((t) => [t <= 1 ? 1 - t / 2 : 0.6 + t, 0], [least])
    for (const t of [0, 0.5, 1]) run.at(t)
    run.breakHere()
    for (const t of [1.1, 1.5]) run.at(t)
    expect([least.value, least.at]).toEqual([0.5, 1])
    expect(run.looks()).toBe(0)
  })

  it('count only while they are watched', () => {
    const least = watch(0, 1, false)
    const run = searchOver((t) => [t, 0], [least])
    run.at(0)
    least.active = true
    run.at(1)
    least.active = false
    run.at(-5)
    expect(least.value).toBe(1)
  })

  it('take no notice of round-off on a quantity that stands still', () => {
    const least = watch(0, 1, true)
    let flip = 1
    const run = searchOver(() => {
      flip = -flip
      return [100 + flip * 1e-12, 0]
    }, [least])
    for (let t = 0; t < 100; t++) run.at(t)
    expect(run.looks()).toBe(0)
    expect(least.value).toBeCloseTo(100, 9)
  })

  it('are looked for with few solutions of the network', () => {
    const least = watch(0, 1, true)
    const run = searchOver((t) => [Math.cosh(t - 0.5), 0], [least])
    for (let t = 0; t <= 1.01; t += 0.2) run.at(t)
    expect(run.looks()).toBeLessThan(25)
  })

  it('are nothing before anything was seen', () => {
    expect(watch(0, 1, true).value).toBeNaN()
  })
})
