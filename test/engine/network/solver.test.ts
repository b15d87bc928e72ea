import fc from 'fast-check'
import * as math from 'mathjs'
import { describe, expect, it } from 'vitest'
import type { StaticLoadInput } from '@/lib/engine/case-input'
import { addBranch, addElement, emptyMatrix, withSourceNode } from '@/lib/engine/network/admittance'
import { reduceNetwork } from '@/lib/engine/network/reduce'
import { createSolver, type NetworkSolver } from '@/lib/engine/network/solver'
import { impedancePart, nonlinearLoads } from '@/lib/engine/network/static-load'
import { perUnit, volt, voltAmpere } from '@/lib/units/si'

type Mix = StaticLoadInput['mix']
const constantPower: Mix = { impedance: 0, current: 0, power: 1 }

const load = (busId: string, p: number, q: number, mix: Mix, floor = 0): StaticLoadInput => ({
  id: busId,
  busId,
  power: { re: voltAmpere(p), im: voltAmpere(q) },
  ratedVoltage: volt(1),
  mix,
  floor: perUnit(floor),
})

/** One bus of 1 V behind r + jx and an EMF, with one load. */
function oneBus(r: number, x: number, emf: number, each: StaticLoadInput): NetworkSolver {
  const matrix = emptyMatrix(1)
  addElement(matrix, 0, 0, impedancePart(each))
  const loads = nonlinearLoads([each], new Map([[each.busId, 0]]))
  const network = reduceNetwork(withSourceNode(matrix, 0, { re: r, im: x }), [0], 1)!
  const solver = createSolver(network, loads, loads.count === 0 ? 1 : 0, Float64Array.of(1))
  solver.driven[0] = emf
  return solver
}

const size = (solver: NetworkSolver, row = 0): number =>
  Math.hypot(solver.voltage[2 * row]!, solver.voltage[2 * row + 1]!)

/** Upper root u = |V|² of u² + (2(RP + XQ) − E²)u + |Z|²|S|² = 0. */
function closedForm(r: number, x: number, emf: number, p: number, q: number): number {
  const b = 2 * (r * p + x * q) - emf ** 2
  return Math.sqrt((-b + Math.sqrt(b * b - 4 * (r * r + x * x) * (p * p + q * q))) / 2)
}

describe('one bus behind a source', () => {
  it('divides the EMF between source and impedance: V = E·Z/(Z + Z_s)', () => {
    const solver = oneBus(0.02, 0.2, 1.05, load('B', 0.8, 0.6, { impedance: 1, current: 0, power: 0 }))
    expect(solver.solve()).toBe(true)
    // Z = 1/conj(S) = 0.8 + 0.6j
    expect(size(solver)).toBeCloseTo(1.05 / Math.hypot(0.82, 0.8), 12)
  })

  it('feeds constant power on the upper of the two voltages of the closed form', () => {
    const draw = fc.record({
      r: fc.integer({ min: 0, max: 100 }),
      x: fc.integer({ min: 20, max: 300 }),
      p: fc.integer({ min: -500, max: 1000 }),
      q: fc.integer({ min: 0, max: 800 }),
    })
    fc.assert(
      fc.property(draw, ({ r, x, p, q }) => {
        const [rr, xx, pp, qq] = [r / 1000, x / 1000, p / 1000, q / 1000]
        const collapse = 1 / (2 * (Math.hypot(rr, xx) * Math.hypot(pp, qq) + rr * pp + xx * qq))
        fc.pre(collapse > 1.02)
        const solver = oneBus(rr, xx, 1, load('B', pp, qq, constantPower))
        expect(solver.solve()).toBe(true)
        expect(size(solver)).toBeCloseTo(closedForm(rr, xx, 1, pp, qq), 10)
        expect(solver.mismatch()).toBeLessThan(1e-12)
      }),
    )
  })

  it('collapses at k = E²/(2(|Z||S| + RP + XQ)) times the load, neither before nor after', () => {
    const [r, x, p, q] = [0.03, 0.25, 0.9, 0.5]
    const k = 1 / (2 * (Math.hypot(r, x) * Math.hypot(p, q) + r * p + x * q))
    for (const [factor, exists] of [
      [0.9, true],
      [0.9999, true],
      [1.0001, false],
      [1.5, false],
    ] as const) {
      const solver = oneBus(r, x, 1, load('B', k * factor * p, k * factor * q, constantPower))
      expect(solver.solve(), `${factor} of the limit`).toBe(exists)
      if (!exists) expect(solver.weakest).toBe(0)
    }
  })

  it('lets a load past its collapse fall through to constant impedance below the floor', () => {
    const solver = oneBus(0.03, 0.25, 1, load('B', 2, 1, constantPower, 0.7))
    expect(solver.solve()).toBe(true)
    // Below the floor S = S₀·(u/0.7)²: an admittance of conj(S₀)/0.49.
    const y = math.complex(2 / 0.49, -1 / 0.49)
    const divided = math.divide(1, math.add(1, math.multiply(math.complex(0.03, 0.25), y)) as math.Complex)
    expect(size(solver)).toBeCloseTo(math.abs(divided as math.Complex) as unknown as number, 10)
    expect(size(solver)).toBeLessThan(0.7)
  })

  it('keeps a constant-current load on its current at any voltage', () => {
    for (const emf of [0.8, 1, 1.2]) {
      const solver = oneBus(0.01, 0.1, emf, load('B', 0.6, 0.3, { impedance: 0, current: 1, power: 0 }))
      expect(solver.solve()).toBe(true)
      const [re, im] = [(emf - solver.voltage[0]!) as number, -solver.voltage[1]!]
      expect(Math.hypot(re, im) / Math.hypot(0.01, 0.1)).toBeCloseTo(Math.hypot(0.6, 0.3), 10)
    }
  })

  it('mixes impedance, current and power by their shares', () => {
    const mix = { impedance: 0.3, current: 0.3, power: 0.4 }
    const solver = oneBus(0.02, 0.15, 1, load('B', 0.9, 0.4, mix))
    solver.solve()
    const u = size(solver)
    const factor = 0.3 * u * u + 0.3 * u + 0.4
    expect(closedForm(0.02, 0.15, 1, 0.9 * factor, 0.4 * factor)).toBeCloseTo(u, 10)
  })

  it('goes on from its last solution in fewer iterations than at first', () => {
    const solver = oneBus(0.03, 0.25, 1, load('B', 0.8, 0.4, constantPower))
    solver.solve()
    const { iterations } = solver.counters
    solver.shunt[1] = -0.001
    solver.solve()
    expect(solver.counters.iterations - iterations).toBeLessThanOrEqual(iterations)
    expect(solver.counters.continuations).toBe(0)
  })

  it('finds the way by continuation after a solution was lost', () => {
    const solver = oneBus(0.03, 0.25, 1, load('B', 0.9, 0.45, constantPower))
    expect(solver.solve()).toBe(true)
    const before = size(solver)
    solver.shunt[1] = -40
    expect(solver.solve()).toBe(false)
    solver.shunt[1] = 0
    expect(solver.solve()).toBe(true)
    expect(size(solver)).toBeCloseTo(before, 10)
  })
})

const part = fc.integer({ min: 1, max: 1000 }).map((whole) => whole / 1000)

/** Random network of five nodes behind a source: branches, admittances at all nodes, ZIP loads at some. */
const network = fc.record({
  branches: fc.array(
    fc.record({ i: fc.integer({ min: 0, max: 4 }), j: fc.integer({ min: 0, max: 4 }), r: part, x: part }),
    { maxLength: 6 },
  ),
  shunts: fc.array(fc.record({ g: part, b: part }), { minLength: 5, maxLength: 5 }),
  loads: fc.array(fc.record({ node: fc.integer({ min: 0, max: 4 }), p: part, z: part, i: part }), { maxLength: 4 }),
})

function build(draw: { branches: { i: number; j: number; r: number; x: number }[] }) {
  const matrix = emptyMatrix(5)
  const join = (i: number, j: number, r: number, x: number) => {
    const square = r * r + x * x
    addBranch(matrix, i, j, { re: (10 * r) / square, im: (-10 * x) / square })
  }
  for (let node = 1; node < 5; node++) join(node - 1, node, 0.2, 0.5)
  for (const { i, j, r, x } of draw.branches) if (i !== j) join(i, j, r, x)
  return matrix
}

describe('networks of several buses', () => {
  it('without nonlinear loads agree with an independent complex solver', () => {
    fc.assert(
      fc.property(network, (draw) => {
        const whole = withSourceNode(build(draw), 0, { re: 0.01, im: 0.08 })
        const reduced = reduceNetwork(whole, [1, 2, 3, 4], 5)!
        const solver = createSolver(reduced, nonlinearLoads([], new Map()), 4, new Float64Array(4).fill(1))
        solver.driven[0] = 1
        draw.shunts.slice(1).forEach(({ g, b }, row) => {
          solver.shunt[2 * row] = g
          solver.shunt[2 * row + 1] = -b
        })
        expect(solver.solve()).toBe(true)
        const nodes = new Float64Array(12)
        solver.recover(nodes)

        const entry = (i: number, j: number) => {
          const y = math.complex(whole.data[2 * (i * 6 + j)]!, whole.data[2 * (i * 6 + j) + 1]!)
          const shunt = draw.shunts[i]!
          return i === j && i > 0 ? (math.add(y, math.complex(shunt.g, -shunt.b)) as math.Complex) : y
        }
        const rows = Array.from({ length: 5 }, (_, i) => Array.from({ length: 5 }, (_, j) => entry(i, j)))
        const right = Array.from({ length: 5 }, (_, i) => math.multiply(-1, entry(i, 5)) as math.Complex)
        const expected = math.lusolve(rows as never, right as never) as unknown as math.Complex[][]
        expected.forEach((row, node) => {
          expect(nodes[2 * node]).toBeCloseTo(row[0]!.re, 10)
          expect(nodes[2 * node + 1]).toBeCloseTo(row[0]!.im, 10)
        })
        expect(solver.mismatch()).toBeLessThan(1e-12)
      }),
    )
  })

  it('with mixed loads balance every current: the loads redrawn as admittances give the same voltages', () => {
    fc.assert(
      fc.property(network, (draw) => {
        const loads = draw.loads.map(({ node, p, z, i }, index) => ({
          ...load(String(node), 0.3 * p, 0.2 * p, { impedance: z / 3, current: i / 3, power: 1 - (z + i) / 3 }),
          id: `L${index}`,
        }))
        const nodeOf = new Map(['0', '1', '2', '3', '4'].map((id, index) => [id, index]))
        const solve = (asAdmittance: Float64Array | null) => {
          const matrix = build(draw)
          const drawn: StaticLoadInput[] = []
          for (const each of loads) {
            const node = nodeOf.get(each.busId)!
            if (asAdmittance === null) {
              addElement(matrix, node, node, impedancePart(each))
              drawn.push(each)
              continue
            }
            const u = Math.hypot(asAdmittance[2 * node]!, asAdmittance[2 * node + 1]!)
            const factor = (each.mix.impedance * u * u + each.mix.current * u + each.mix.power) / (u * u)
            addElement(matrix, node, node, { re: each.power.re * factor, im: -each.power.im * factor })
          }
          const kept = nonlinearLoads(drawn, nodeOf)
          const nonlinear = [...new Set(kept.node)]
          const linear = [0, 1, 2, 3, 4].filter((node) => !nonlinear.includes(node))
          const reduced = reduceNetwork(
            withSourceNode(matrix, 0, { re: 0.01, im: 0.08 }),
            [...linear, ...nonlinear],
            5,
          )!
          const solver = createSolver(reduced, kept, linear.length, new Float64Array(5).fill(1))
          solver.driven[0] = 1
          expect(solver.solve()).toBe(true)
          expect(solver.mismatch()).toBeLessThan(1e-12)
          const nodes = new Float64Array(12)
          solver.recover(nodes)
          return nodes
        }
        const nodes = solve(null)
        solve(nodes).forEach((value, index) => {
          expect(value).toBeCloseTo(nodes[index]!, 10)
        })
      }),
    )
  })

  it('name the row of the lowest voltage when there is no solution', () => {
    const matrix = emptyMatrix(3)
    addBranch(matrix, 0, 1, { re: 0, im: -10 })
    addBranch(matrix, 1, 2, { re: 0, im: -2 })
    const nodeOf = new Map([
      ['1', 1],
      ['2', 2],
    ])
    const loads = nonlinearLoads([load('1', 0.1, 0, constantPower), load('2', 5, 3, constantPower)], nodeOf)
    const reduced = reduceNetwork(withSourceNode(matrix, 0, { re: 0, im: 0.1 }), [1, 2], 3)!
    const solver = createSolver(reduced, loads, 0, Float64Array.of(1, 1))
    solver.driven[0] = 1
    expect(solver.solve()).toBe(false)
    expect(solver.weakest).toBe(1)
  })
})
