import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { addSample, sampleAt, sampleStore, thinSamples } from '@/lib/engine/runup/sampler'

function storeOf(course: (t: number) => number[], times: readonly number[]) {
  const store = sampleStore(course(0).length)
  for (const t of times) addSample(store, t, Float64Array.from(course(t)))
  return store
}

const evenly = (count: number, until = 1): number[] =>
  Array.from({ length: count }, (_, i) => (until * i) / (count - 1))

describe('samples of a run', () => {
  it('are kept in order however many there are', () => {
    const store = storeOf((t) => [t, -t], evenly(1000))
    expect(store.count).toBe(1000)
    expect([...sampleAt(store, 999)]).toEqual([1, -1])
    expect(store.time[500]).toBeCloseTo(500 / 999, 12)
  })

  it('thinned, leave lines that are true to half a thousandth of the range', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 12 }), fc.integer({ min: 20, max: 400 }), (waves, count) => {
        const course = (t: number) => [Math.sin(waves * t), t * t]
        const store = storeOf(course, evenly(count))
        const kept = thinSamples(store, [0, 1], Float64Array.of(1, 1))
        expect(kept[0]).toBe(0)
        expect(kept.at(-1)).toBe(count - 1)
        for (let k = 1; k < kept.length; k++) {
          const [a, b] = [kept[k - 1]!, kept[k]!]
          for (let i = a + 1; i < b; i++) {
            const part = (store.time[i]! - store.time[a]!) / (store.time[b]! - store.time[a]!)
            for (const c of [0, 1]) {
              const line = sampleAt(store, a)[c]! * (1 - part) + sampleAt(store, b)[c]! * part
              expect(Math.abs(sampleAt(store, i)[c]! - line)).toBeLessThanOrEqual(5.001e-4 * 2)
            }
          }
        }
      }),
    )
  })

  it('thinned, are few where the run is smooth', () => {
    const store = storeOf((t) => [Math.exp(-5 * t)], evenly(5000))
    const kept = thinSamples(store, [0], Float64Array.of(1))
    expect(kept.length).toBeLessThan(60)
    expect(kept.length).toBeGreaterThan(8)
  })

  it('of a straight line are its two ends', () => {
    expect(
      thinSamples(
        storeOf((t) => [3 * t], evenly(50)),
        [0],
        Float64Array.of(1),
      ),
    ).toEqual([0, 49])
  })

  it('thinned, keep both sides of every switching', () => {
    const times = [0, 0.5, 1, 1, 1.5, 2, 2, 3]
    let index = -1
    const values = [0, 0, 0, 5, 5, 5, 2, 2]
    const store = storeOf(() => {
      index++
      return [values[Math.max(0, index - 1)]!]
    }, times)
    expect(thinSamples(store, [0], Float64Array.of(1))).toEqual([0, 2, 3, 5, 6, 7])
  })

  it('look at the given channels only', () => {
    const store = storeOf((t) => [t, Math.sin(30 * t)], evenly(100))
    expect(thinSamples(store, [0], Float64Array.of(1, 1))).toEqual([0, 99])
  })

  it('of a run without length are what there is', () => {
    expect(
      thinSamples(
        storeOf((t) => [t], []),
        [0],
        Float64Array.of(1),
      ),
    ).toEqual([])
    expect(
      thinSamples(
        storeOf((t) => [t], [0]),
        [0],
        Float64Array.of(1),
      ),
    ).toEqual([0])
  })
})
