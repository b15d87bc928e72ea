import fc from 'fast-check'
import * as math from 'mathjs'
import { describe, expect, it } from 'vitest'
import {
  add,
  complex,
  conjugate,
  divide,
  isZero,
  magnitude,
  multiply,
  reciprocal,
  scale,
  subtract,
} from '@/lib/engine/numeric/complex'

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
        same(add(a, b), math.add(x, y))
        same(subtract(a, b), math.subtract(x, y))
        same(multiply(a, b), math.multiply(x, y) as math.Complex)
        same(conjugate(a), math.conj(x))
        expect(magnitude(a)).toBeCloseTo(math.abs(x) as unknown as number, 9)
        if (!isZero(b)) same(divide(a, b), math.divide(x, y) as math.Complex)
      }),
    )
  })

  it('have a reciprocal that gives one in the product', () => {
    fc.assert(
      fc.property(
        number.filter((a) => !isZero(a)),
        (a) => {
          const one = multiply(a, reciprocal(a))
          expect(one.re).toBeCloseTo(1, 9)
          expect(one.im).toBeCloseTo(0, 9)
        },
      ),
    )
  })

  it('scale both parts', () => {
    expect(scale(complex(3, -4), 2)).toEqual({ re: 6, im: -8 })
  })

  it('are zero only when both parts are', () => {
    expect(isZero(complex(0, 0))).toBe(true)
    expect(isZero(complex(0, 1e-300))).toBe(false)
  })
})
