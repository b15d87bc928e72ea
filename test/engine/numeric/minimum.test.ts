import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findMinimum } from '@/lib/engine/numeric/minimum'

const start = (f: (x: number) => number, at: number) => ({ at, value: f(at) })

describe('a minimum in a bracket', () => {
  it('is found for parabolas wherever they lie', () => {
    const place = fc.integer({ min: -900, max: 900 }).map((whole) => whole / 1000)
    fc.assert(
      fc.property(place, fc.integer({ min: 1, max: 1000 }), (at, height) => {
        const f = (x: number) => height * (x - at) ** 2 + 3
        const found = findMinimum(f, -1, start(f, at / 2 - 0.01), 1, 1e-8)
        expect(found.at).toBeCloseTo(at, 6)
        expect(found.value).toBeCloseTo(3, 9)
      }),
    )
  })

  it('is found where the function is no parabola', () => {
    const shapes: [(x: number) => number, number][] = [
      [(x) => Math.cos(x), Math.PI],
      [(x) => Math.abs(x - 3.3), 3.3],
      [(x) => (x - 2.9) ** 4, 2.9],
      [(x) => -1 / (0.01 + (x - 3) ** 2), 3],
    ]
    for (const [f, at] of shapes) {
      const found = findMinimum(f, 2, start(f, 3.05), 4, 1e-7)
      expect(found.at).toBeCloseTo(at, 1)
      expect(found.value).toBeCloseTo(f(at), 6)
    }
  })

  it('is never worse than the point it began with', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 99 }), fc.integer({ min: 1, max: 30 }), (percent, waves) => {
        const f = (x: number) => Math.sin(waves * x) + x
        const inside = start(f, percent / 100)
        expect(findMinimum(f, 0, inside, 1, 1e-6).value).toBeLessThanOrEqual(inside.value)
      }),
    )
  })

  it('stays inside the bracket when the least value lies at its end', () => {
    const found = findMinimum(
      (x) => x,
      0,
      start((x) => x, 0.5),
      1,
      1e-6,
    )
    expect(found.at).toBeGreaterThanOrEqual(0)
    expect(found.at).toBeLessThan(1e-4)
  })
})
