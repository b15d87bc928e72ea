import fc from 'fast-check'
import * as math from 'mathjs'
import { describe, expect, it } from 'vitest'
import { solveReal } from '@/lib/engine/numeric/real-lu'

const element = fc.integer({ min: -900, max: 900 }).map((whole) => whole / 100)

const system = fc.integer({ min: 1, max: 10 }).chain((n) =>
  fc.record({
    n: fc.constant(n),
    a: fc.array(element, { minLength: n * n, maxLength: n * n }),
    b: fc.array(element, { minLength: n, maxLength: n }),
  }),
)

describe('real linear equations', () => {
  it('agree with an independent library', () => {
    fc.assert(
      fc.property(system, ({ n, a, b }) => {
        const matrix = a.map((value, index) => (index % (n + 1) === 0 ? value + 100 : value))
        const rows = Array.from({ length: n }, (_, i) => matrix.slice(i * n, (i + 1) * n))
        const expected = math.lusolve(rows, b) as number[][]
        const x = Float64Array.from(b)
        expect(solveReal(Float64Array.from(matrix), x, n)).toBe(true)
        expected.forEach((row, i) => {
          expect(x[i]).toBeCloseTo(row[0]!, 10)
        })
      }),
    )
  })

  it('exchange rows where the diagonal is zero', () => {
    const b = Float64Array.of(5, 7)
    expect(solveReal(Float64Array.of(0, 2, 3, 1), b, 2)).toBe(true)
    expect(b[1]).toBeCloseTo(2.5, 12)
    expect(b[0]).toBeCloseTo(1.5, 12)
  })

  it('say when the matrix is singular', () => {
    expect(solveReal(Float64Array.of(1, 2, 2, 4), Float64Array.of(1, 2), 2)).toBe(false)
    expect(solveReal(Float64Array.of(Number.NaN), Float64Array.of(1), 1)).toBe(false)
  })
})
