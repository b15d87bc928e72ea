import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { addBranch, addElement, emptyMatrix } from '@/lib/engine/network/admittance'
import { reduceNetwork } from '@/lib/engine/network/reduce'
import { solveComplex } from '@/lib/engine/numeric/complex-lu'

const share = fc.integer({ min: 1, max: 1000 }).map((whole) => whole / 100)

/** A connected network of six nodes with shunts at every one; node 5 drives. */
const network = fc.record({
  branches: fc.array(
    fc.record({ i: fc.integer({ min: 0, max: 5 }), j: fc.integer({ min: 0, max: 5 }), g: share, b: share }),
    {
      minLength: 3,
      maxLength: 10,
    },
  ),
  shunts: fc.array(share, { minLength: 6, maxLength: 6 }),
  keep: fc.subarray([0, 1, 2, 3, 4]),
})

describe('the reduced network', () => {
  it('gives every node the voltage that the whole network gives it', () => {
    fc.assert(
      fc.property(network, ({ branches, shunts, keep }) => {
        const matrix = emptyMatrix(6)
        for (let node = 1; node < 6; node++) addBranch(matrix, node - 1, node, { re: 1, im: -2 })
        for (const { i, j, g, b } of branches) if (i !== j) addBranch(matrix, i, j, { re: g, im: -b })
        shunts.forEach((g, node) => {
          addElement(matrix, node, node, { re: g / 10, im: 0 })
        })
        // The whole: nodes 0 to 4 unknown, node 5 at 100 V.
        const whole = new Float64Array(50)
        const right = new Float64Array(10)
        for (let i = 0; i < 5; i++) {
          for (let j = 0; j < 5; j++) {
            whole[2 * (i * 5 + j)] = matrix.data[2 * (i * 6 + j)]!
            whole[2 * (i * 5 + j) + 1] = matrix.data[2 * (i * 6 + j) + 1]!
          }
          right[2 * i] = -100 * matrix.data[2 * (i * 6 + 5)]!
          right[2 * i + 1] = -100 * matrix.data[2 * (i * 6 + 5) + 1]!
        }
        solveComplex(whole, right, 5, 1)

        const reduced = reduceNetwork(matrix, keep, 5)!
        const columns = keep.length + 1
        const a = Float64Array.from(reduced.admittance)
        const kept = reduced.source.map((value) => 100 * value)
        expect(solveComplex(a, kept, keep.length, 1)).toBe(true)
        for (let node = 0; node < 5; node++) {
          let [re, im] = [0, 0]
          for (let j = 0; j < columns; j++) {
            const at = 2 * (node * columns + j)
            const [rRe, rIm] = [reduced.recovery[at]!, reduced.recovery[at + 1]!]
            const [vRe, vIm] = j < keep.length ? [kept[2 * j]!, kept[2 * j + 1]!] : [100, 0]
            re += rRe * vRe - rIm * vIm
            im += rRe * vIm + rIm * vRe
          }
          expect(re).toBeCloseTo(right[2 * node]!, 8)
          expect(im).toBeCloseTo(right[2 * node + 1]!, 8)
        }
      }),
    )
  })

  it('knows where each node went', () => {
    const matrix = emptyMatrix(3)
    addBranch(matrix, 0, 1, { re: 1, im: 0 })
    addBranch(matrix, 1, 2, { re: 1, im: 0 })
    expect([...reduceNetwork(matrix, [1], 2)!.rowOf]).toEqual([-1, 0, -1])
  })

  it('without a driving node keeps the admittance seen from a bus: two branches in series', () => {
    const matrix = emptyMatrix(2)
    addBranch(matrix, 0, 1, { re: 1, im: 0 })
    addElement(matrix, 1, 1, { re: 1, im: 0 })
    const seen = reduceNetwork(matrix, [0], null)!
    expect(seen.admittance[0]).toBeCloseTo(0.5, 12)
  })

  it('does not exist where a part to be eliminated floats', () => {
    const matrix = emptyMatrix(3)
    addBranch(matrix, 0, 1, { re: 1, im: 0 })
    expect(reduceNetwork(matrix, [0], 1)).toBeNull()
  })

  it('does not exist at an exact resonance', () => {
    const matrix = emptyMatrix(3)
    addBranch(matrix, 0, 1, { re: 0, im: -1 })
    addBranch(matrix, 1, 2, { re: 0, im: -1 })
    addElement(matrix, 1, 1, { re: 0, im: 2 })
    expect(reduceNetwork(matrix, [0], 2)).toBeNull()
  })
})
