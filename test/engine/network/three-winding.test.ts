import { describe, expect, it } from 'vitest'
import type { ThreeWindingInput } from '@/lib/engine/case-input'
import { branchMatrix } from '@/lib/engine/network/admittance'
import { reduceNetwork } from '@/lib/engine/network/reduce'
import { couplings } from '@/lib/engine/network/three-winding'
import { findTopology } from '@/lib/engine/network/topology'
import { ohm, volt } from '@/lib/units/si'

const ohms = (re: number, im: number) => ({ re: ohm(re), im: ohm(im) })

/** 33/6.6/0.4 kV, the impedances between pairs of windings in ohm at 33 kV; the star's middle arm is negative. */
const transformer: ThreeWindingInput = {
  id: 'T',
  windings: [
    { busId: 'A', ratio: 1, lag: 0 },
    { busId: 'B', ratio: 0.2, lag: (11 * Math.PI) / 6 },
    { busId: 'C', ratio: 0.4 / 33, lag: 0 },
  ],
  impedance: [ohms(0.4, 8), ohms(0.6, 12), ohms(1.3, 26)],
}

const buses = ['A', 'B', 'C'].map((id) => ({ id, nominal: volt(1000) }))
const ways = [
  { fromBusId: 'A', toBusId: 'B' },
  { fromBusId: 'A', toBusId: 'C' },
]

function matrixOf(input: ThreeWindingInput) {
  const found = findTopology(buses, [], ways, 'A')
  if (!found.ok) throw new Error('no topology')
  return branchMatrix(found.value, [], [], [input])
}

/** Impedance at one winding with another short-circuited and the third open, referred to the first winding. */
function measured(at: number, shorted: number): { re: number; im: number } {
  const matrix = matrixOf(transformer)
  // A short circuit is a very large admittance to earth.
  const place = 2 * (shorted * 3 + shorted)
  matrix.data[place] = matrix.data[place]! + 1e12
  const seen = reduceNetwork(matrix, [at], null)!.admittance
  const square = seen[0]! ** 2 + seen[1]! ** 2
  const per = transformer.windings[at]!.ratio ** 2
  return { re: seen[0]! / square / per, im: -seen[1]! / square / per }
}

describe('a three-winding transformer', () => {
  it.each([
    [0, 1, 0],
    [1, 2, 1],
    [2, 0, 2],
  ])('shows between windings %i and %i the impedance it was given, the third open', (at, shorted, pair) => {
    const { re, im } = measured(at, shorted)
    expect(re).toBeCloseTo(transformer.impedance[pair]!.re, 6)
    expect(im).toBeCloseTo(transformer.impedance[pair]!.im, 6)
  })

  it('holds its no-load voltages and their angles without a load', () => {
    const seen = reduceNetwork(matrixOf(transformer), [], 0)!.recovery
    const angle = Math.PI / 6
    expect(seen[2]).toBeCloseTo(0.2 * Math.cos(angle), 12)
    expect(seen[3]).toBeCloseTo(0.2 * Math.sin(angle), 12)
    expect(seen[4]).toBeCloseTo(0.4 / 33, 12)
    expect(seen[5]).toBeCloseTo(0, 12)
  })

  it('may have one arm of its star without impedance, and no more', () => {
    const arms = (a: number, b: number, c: number) => [ohms(0, a + b), ohms(0, b + c), ohms(0, c + a)] as const
    const one = couplings({ ...transformer, impedance: arms(4, 0, 6) })!
    expect(one.map(({ admittance }) => admittance.im)).toEqual([-1 / 4, -1 / 6, -0])
    expect(couplings({ ...transformer, impedance: arms(4, 0, 0) })).toBeNull()
  })
})
