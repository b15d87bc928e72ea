import fc from 'fast-check'
import { describe, expect, it, test } from 'vitest'
import { largePlant } from '@/lib/cli/large-plant'
import type { StaticLoadInput } from '@/lib/engine/case-input'
import { type AdmittanceMatrix, addBranch, emptyMatrix, withSourceNode } from '@/lib/engine/network/admittance'
import { eliminationOrder } from '@/lib/engine/network/elimination-order'
import { reduceNetwork } from '@/lib/engine/network/reduce'
import { createSolver } from '@/lib/engine/network/solver'
import { createSparseSolver } from '@/lib/engine/network/sparse-solver'
import { nonlinearLoads } from '@/lib/engine/network/static-load'
import { runCase } from '@/lib/engine/run-case'
import { perUnit, volt, voltAmpere } from '@/lib/units/si'

const nodes = 12

/** A connected network of twelve nodes of 1 V behind a source, with a few meshes. */
const networks = fc
  .record({
    parents: fc.array(fc.integer({ min: 0, max: 11 }), { minLength: nodes, maxLength: nodes }),
    meshes: fc.array(fc.tuple(fc.integer({ min: 0, max: 11 }), fc.integer({ min: 0, max: 11 })), { maxLength: 5 }),
    impedances: fc.array(fc.integer({ min: 5, max: 80 }), { minLength: 40, maxLength: 40 }),
  })
  .map(({ parents, meshes, impedances }): AdmittanceMatrix => {
    const matrix = emptyMatrix(nodes)
    let next = 0
    const join = (i: number, j: number) => {
      const x = impedances[next++ % impedances.length]! / 4000
      addBranch(matrix, i, j, { re: (0.4 * x) / (1.16 * x * x), im: -x / (1.16 * x * x) })
    }
    for (let node = 1; node < nodes; node++) join(node, parents[node]! % node)
    for (const [i, j] of meshes) if (i !== j) join(i, j)
    return withSourceNode(matrix, 0, { re: 0.01, im: 0.05 })
  })

const load = (node: number, p: number): StaticLoadInput => ({
  id: `S${node}`,
  busId: String(node),
  power: { re: voltAmpere(p), im: voltAmpere(p / 2) },
  ratedVoltage: volt(1),
  mix: { impedance: 0, current: 0.4, power: 0.6 },
  floor: perUnit(0.7),
})

const nodeOf = new Map(Array.from({ length: nodes }, (_, node) => [String(node), node]))

const solved = (matrix: AdmittanceMatrix, power: number, shunts: readonly number[]) => {
  const loads = nonlinearLoads([load(3, power), load(7, power / 2), load(11, power)], nodeOf)
  const keep = [...nodeOf.values()].filter((node) => ![3, 7, 11].includes(node))
  const dense = createSolver(reduceNetwork(matrix, [...keep, 3, 7, 11], nodes)!, loads, 9, new Float64Array(12).fill(1))
  const sparse = createSparseSolver(matrix, loads, nodes, () => 1)
  const rowOf = [...keep, 3, 7, 11]
  for (const solver of [dense, sparse.solver]) solver.driven.set([1.04, 0.02])
  shunts.forEach((y, node) => {
    dense.shunt[2 * rowOf.indexOf(node) + 1] = -y
    sparse.solver.shunt[2 * sparse.rowOf[node]! + 1] = -y
  })
  const found = [dense.solve(), sparse.solver.solve()]
  const voltages = [new Float64Array(26), new Float64Array(26)] as const
  dense.recover(voltages[0])
  sparse.solver.recover(voltages[1])
  return { found, voltages, mismatch: sparse.solver.mismatch() }
}

describe('a network solved whole', () => {
  it('has the voltages of the reduced one, with motors and loads at any place', () => {
    const shunts = fc.array(fc.integer({ min: 0, max: 300 }), { minLength: nodes, maxLength: nodes })
    fc.assert(
      fc.property(networks, fc.integer({ min: 0, max: 300 }), shunts, (matrix, power, drawn) => {
        const { found, voltages, mismatch } = solved(
          matrix,
          power / 1000,
          drawn.map((y) => y / 1000),
        )
        expect(found[1]).toBe(found[0])
        if (!found[0]) return
        expect(mismatch).toBeLessThan(1e-12)
        for (let i = 0; i < 26; i++) expect(Math.abs(voltages[0][i]! - voltages[1][i]!)).toBeLessThan(1e-9)
      }),
    )
  })

  it('has no solution where the reduced one has none', () => {
    const matrix = withSourceNode(emptyMatrix(nodes), 0, { re: 0.01, im: 0.05 })
    for (let node = 1; node < nodes; node++) addBranch(matrix, node, node - 1, { re: 2, im: -5 })
    const heavy = { ...load(11, 5), mix: { impedance: 0, current: 0, power: 1 }, floor: perUnit(0) }
    const loads = nonlinearLoads([heavy], nodeOf)
    const { solver } = createSparseSolver(matrix, loads, nodes, () => 1)
    solver.driven.set([1, 0])
    expect(solver.solve()).toBe(false)
  })
})

describe('the order of elimination', () => {
  it('leaves a radial network without a new element', () => {
    const matrix = emptyMatrix(60)
    for (let node = 1; node < 60; node++) addBranch(matrix, node, Math.floor((node - 1) / 3), { re: 1, im: -3 })
    const { joined } = eliminationOrder(matrix, () => true)
    expect(joined.reduce((sum, nodesLeft) => sum + nodesLeft.length, 0)).toBe(59)
  })

  it('takes every node that goes once', () => {
    const matrix = emptyMatrix(9)
    for (let node = 1; node < 9; node++) addBranch(matrix, node, 0, { re: 1, im: -3 })
    const { order } = eliminationOrder(matrix, (node) => node !== 4)
    expect([...order].sort((a, b) => a - b)).toEqual([0, 1, 2, 3, 5, 6, 7, 8])
  })
})

test('fifty motors on five hundred buses come back together after an interruption', () => {
  const { outcome, motors, places, counters } = runCase(largePlant(500, 50, true))
  expect(outcome.kind).toBe('complete')
  expect(places).toHaveLength(500)
  expect(motors.map(({ running }) => running?.outcome.kind)).toEqual(Array(50).fill('rode-through'))
  expect(counters.largestMismatch).toBeLessThan(1e-12)
})

test('a plant is the same whether solved whole or reduced: more buses on the way change nothing', () => {
  // the same motors and loads; below two dozen places the reduced network is solved
  const few = largePlant(20, 4, true)
  const stub = Array.from({ length: 30 }, (_, i) => ({ id: `X${i}`, nominal: volt(6600) }))
  const tails = stub.map(({ id }, i) => ({ ...few.lines[0]!, id: `tail ${id}`, fromBusId: `B${i % 20}`, toBusId: id }))
  const tiny = stub.map(({ id }) => ({ ...load(0, 1e-9), id: `tiny ${id}`, busId: id, ratedVoltage: volt(6600) }))
  const more = {
    ...few,
    buses: [...few.buses, ...stub],
    lines: [...few.lines, ...tails],
    loads: [...few.loads, ...tiny],
  }
  const [a, b] = [runCase(few), runCase(more)]
  for (const [i, place] of a.places.entries()) expect(b.places[i]!.before / place.before).toBeCloseTo(1, 9)
  for (const [i, motor] of a.motors.entries()) {
    const [one, other] = [motor.running!, b.motors[i]!.running!]
    expect(other.peakCurrent.current / one.peakCurrent.current).toBeCloseTo(1, 6)
    expect(other.lowestSpeed.speed / one.lowestSpeed.speed).toBeCloseTo(1, 6)
  }
})
