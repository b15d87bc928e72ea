import fc from 'fast-check'
import * as math from 'mathjs'
import { describe, expect, it } from 'vitest'
import { conjugate, isZero, magnitude, reciprocal, scale, subtract } from '@/lib/engine/numeric/complex'

const part = fc.integer({ min: -1000, max: 1000 }).map((whole) => whole / 100)
const number = fc.record({ re: part, im: part })

const same = (a: { re: number; im: number }, b: math.Complex) => {
  expect(a.re).toBeCloseTo(b.re, 9)
  expect(a.im).toBeCloseTo(b.im, 9)
}

describe('complex numbers', () => {
  it('calculate as an independent library does', () => {
    fc.assert(
      fc.property(number, number, (a, b) => {
        const [x, y] = [math.complex(a.re, a.im), math.complex(b.re, b.im)]
        same(subtract(a, b), math.subtract(x, y))
        same(conjugate(a), math.conj(x))
        expect(magnitude(a)).toBeCloseTo(math.abs(x) as unknown as number, 9)
        if (!isZero(b)) same(reciprocal(b), math.divide(1, y) as math.Complex)
      }),
    )
  })

  it('have no finite reciprocal of zero', () => {
    expect(Number.isFinite(reciprocal({ re: 0, im: 0 }).re)).toBe(false)
  })

  it('scale both parts', () => {
    expect(scale({ re: 3, im: -4 }, 2)).toEqual({ re: 6, im: -8 })
  })

  it('are zero only when both parts are', () => {
    expect(isZero({ re: 0, im: 0 })).toBe(true)
    expect(isZero({ re: 0, im: 1e-300 })).toBe(false)
  })
})
