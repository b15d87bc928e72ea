import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { interpolant } from '@/lib/engine/numeric/interpolant'

const points = fc
  .array(fc.tuple(fc.integer({ min: 1, max: 100 }), fc.integer({ min: -100, max: 100 })), {
    minLength: 3,
    maxLength: 12,
  })
  .map((steps) => {
    let at = 0
    return {
      x: steps.map(([step]) => {
        at += step
        return at
      }),
      y: steps.map(([, value]) => value),
    }
  })

describe('a curve through points', () => {
  for (const kind of ['linear', 'monotone'] as const) {
    it(`${kind}, goes through each of them, in any order of asking`, () => {
      fc.assert(
        fc.property(points, fc.infiniteStream(fc.nat()), ({ x, y }, order) => {
          const curve = interpolant(x, y, kind)
          for (let k = 0; k < 2 * x.length; k++) {
            const i = order.next().value! % x.length
            expect(curve(x[i]!)).toBeCloseTo(y[i]!, 9)
          }
        }),
      )
    })

    it(`${kind}, never leaves the range of the two points it lies between`, () => {
      fc.assert(
        fc.property(points, fc.integer({ min: 0, max: 1000 }), ({ x, y }, part) => {
          const curve = interpolant(x, y, kind)
          for (let i = 0; i + 1 < x.length; i++) {
            const at = x[i]! + ((x[i + 1]! - x[i]!) * part) / 1000
            expect(curve(at)).toBeGreaterThanOrEqual(Math.min(y[i]!, y[i + 1]!) - 1e-9)
            expect(curve(at)).toBeLessThanOrEqual(Math.max(y[i]!, y[i + 1]!) + 1e-9)
          }
        }),
      )
    })

    it(`${kind}, follows a straight line exactly`, () => {
      const curve = interpolant([0, 1, 4, 9], [1, 3, 9, 19], kind)
      for (const at of [0.3, 2, 5.5, 8.99]) expect(curve(at)).toBeCloseTo(1 + 2 * at, 12)
    })
  }

  it('monotone, is smoother than straight lines: a sine to a thousandth from 13 points', () => {
    const x = Array.from({ length: 13 }, (_, i) => (i * Math.PI) / 24)
    const curve = interpolant(x, x.map(Math.sin), 'monotone')
    const straight = interpolant(x, x.map(Math.sin))
    const worst = (of: (at: number) => number) =>
      Math.max(
        ...Array.from({ length: 300 }, (_, i) => (i * Math.PI) / 600).map((at) => Math.abs(of(at) - Math.sin(at))),
      )
    expect(worst(curve)).toBeLessThan(1e-3)
    expect(worst(curve)).toBeLessThan(worst(straight) / 2)
  })

  it('holds its end values outside', () => {
    const curve = interpolant([1, 2, 3], [5, 6, 9])
    expect([curve(0), curve(4)]).toEqual([5, 9])
  })
})
