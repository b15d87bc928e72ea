import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findRoot } from '@/lib/engine/numeric/root'

describe('a root between two bounds', () => {
  it('is found to the tolerance for functions of any bend', () => {
    const shapes: ((x: number) => number)[] = [
      (x) => x,
      (x) => x ** 3 + x,
      (x) => Math.tanh(50 * x),
      (x) => Math.sign(x) * Math.sqrt(Math.abs(x)),
      (x) => Math.expm1(8 * x),
      (x) => x ** 9,
    ]
    const where = fc.integer({ min: -999, max: 999 }).map((whole) => whole / 1000)
    fc.assert(
      fc.property(where, fc.constantFrom(...shapes), fc.boolean(), (root, shape, turned) => {
        const f = (x: number) => (turned ? -shape(x - root) : shape(x - root))
        expect(Math.abs(findRoot(f, -1, 1, 1e-10) - root)).toBeLessThanOrEqual(2e-10)
      }),
    )
  })

  it('needs few evaluations where the function is nearly straight', () => {
    let evaluations = 0
    findRoot(
      (x) => {
        evaluations++
        return x - 0.3 + 0.01 * x * x
      },
      0,
      1,
      1e-12,
    )
    expect(evaluations).toBeLessThan(20)
  })

  it('needs no more than twice a bisection where it is very bent', () => {
    let evaluations = 0
    findRoot(
      (x) => {
        evaluations++
        return (x - 0.9) ** 21
      },
      0,
      1,
      1e-9,
    )
    expect(evaluations).toBeLessThan(110)
  })

  it('is a bound itself where the function is zero there', () => {
    expect(findRoot((x) => x, 0, 1, 1e-9)).toBe(0)
    expect(findRoot((x) => x - 1, 0, 1, 1e-9)).toBe(1)
  })

  it('is located where a function jumps', () => {
    expect(findRoot((x) => (x < 0.7 ? -1 : 1), 0, 1, 1e-9)).toBeCloseTo(0.7, 8)
  })

  it('takes values at the bounds that are known already', () => {
    let evaluations = 0
    const f = (x: number) => {
      evaluations++
      return x - 0.5
    }
    findRoot(f, 0, 1, 1e-9, -0.5, 0.5)
    expect(evaluations).toBeLessThanOrEqual(3)
  })
})
