import fc from 'fast-check'
import * as math from 'mathjs'
import { describe, expect, it } from 'vitest'
import { solveComplex } from '@/lib/engine/numeric/complex-lu'

const element = fc.integer({ min: -500, max: 500 }).map((whole) => whole / 100)

/** Order, interleaved matrix and right-hand sides. */
const system = fc
  .record({ n: fc.integer({ min: 1, max: 8 }), columns: fc.integer({ min: 1, max: 3 }) })
  .chain(({ n, columns }) =>
    fc.record({
      n: fc.constant(n),
      columns: fc.constant(columns),
      a: fc.array(element, { minLength: 2 * n * n, maxLength: 2 * n * n }),
      b: fc.array(element, { minLength: 2 * n * columns, maxLength: 2 * n * columns }),
    }),
  )

/** A·x for interleaved numbers. */
function times(a: readonly number[], x: ArrayLike<number>, n: number, columns: number): number[] {
  const product = new Array<number>(2 * n * columns).fill(0)
  for (let i = 0; i < n; i++) {
    for (let j = 0; j < columns; j++) {
      for (let k = 0; k < n; k++) {
        const [re, im] = [a[2 * (i * n + k)]!, a[2 * (i * n + k) + 1]!]
        const [xr, xi] = [x[2 * (k * columns + j)]!, x[2 * (k * columns + j) + 1]!]
        product[2 * (i * columns + j)]! += re * xr - im * xi
        product[2 * (i * columns + j) + 1]! += re * xi + im * xr
      }
    }
  }
  return product
}

const dominant = (a: readonly number[], n: number): number[] =>
  a.map((value, index) => (index % (2 * (n + 1)) === 0 ? value + 60 : value))

describe('complex linear equations', () => {
  it('leave no residual, whatever the order and the number of right-hand sides', () => {
    fc.assert(
      fc.property(system, ({ n, columns, a, b }) => {
        const matrix = dominant(a, n)
        const x = Float64Array.from(b)
        expect(solveComplex(Float64Array.from(matrix), x, n, columns)).toBe(true)
        times(matrix, x, n, columns).forEach((value, index) => {
          expect(value).toBeCloseTo(b[index]!, 10)
        })
      }),
    )
  })

  it('agree with the complex solver of an independent library', () => {
    fc.assert(
      fc.property(system, ({ n, a, b }) => {
        const matrix = dominant(a, n)
        const rows = Array.from({ length: n }, (_, i) =>
          Array.from({ length: n }, (_, j) => math.complex(matrix[2 * (i * n + j)]!, matrix[2 * (i * n + j) + 1]!)),
        )
        const right = Array.from({ length: n }, (_, i) => math.complex(b[2 * i]!, b[2 * i + 1]!))
        const expected = math.lusolve(rows as never, right as never) as unknown as math.Complex[][]
        const x = Float64Array.from(b.slice(0, 2 * n))
        solveComplex(Float64Array.from(matrix), x, n, 1)
        expected.forEach((row, i) => {
          expect(x[2 * i]).toBeCloseTo(row[0]!.re, 10)
          expect(x[2 * i + 1]).toBeCloseTo(row[0]!.im, 10)
        })
      }),
    )
  })

  it('find the pivot below a zero on the diagonal', () => {
    // [0 1; 1 0]·x = (2, 3j)
    const a = Float64Array.of(0, 0, 1, 0, 1, 0, 0, 0)
    const b = Float64Array.of(2, 0, 0, 3)
    expect(solveComplex(a, b, 2, 1)).toBe(true)
    expect([...b]).toEqual([0, 3, 2, 0])
  })

  it('say when the matrix is singular', () => {
    // Second row is j times the first.
    const a = Float64Array.of(1, 0, 2, 0, 0, 1, 0, 2)
    expect(solveComplex(a, Float64Array.of(1, 0, 1, 0), 2, 1)).toBe(false)
  })

  it('solve nothing for order zero', () => {
    expect(solveComplex(new Float64Array(0), new Float64Array(0), 0, 1)).toBe(true)
  })
})
