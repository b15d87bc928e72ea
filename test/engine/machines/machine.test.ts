import fc from 'fast-check'
import * as math from 'mathjs'
import { describe, expect, it } from 'vitest'
import type { InductionCircuit } from '@/lib/engine/case-input'
import { atSlip, torqueAt } from '@/lib/engine/machines/at-slip'
import { breakdownSlip } from '@/lib/engine/machines/breakdown-slip'
import { evaluateMachine, machineTable } from '@/lib/engine/machines/machine-table'
import { ohm, radianPerSecond } from '@/lib/units/si'

const draw = (min: number, max: number) =>
  fc.integer({ min: 0, max: 1000 }).map((part) => min + ((max - min) * part) / 1000)

const cage = fc.record({ r: draw(0.005, 0.1), x: draw(0.02, 0.3) })

const circuit = fc
  .record({
    rs: draw(0.001, 0.05),
    xs: draw(0.03, 0.2),
    xm: draw(1.5, 5),
    rc: fc.option(draw(15, 100)),
    cages: fc.array(cage, { minLength: 1, maxLength: 2 }),
  })
  .map(
    ({ rs, xs, xm, rc, cages }): InductionCircuit => ({
      stator: { re: ohm(rs), im: ohm(xs) },
      magnetising: ohm(xm),
      core: rc === null ? null : ohm(rc),
      cages: cages.map(({ r, x }) => ({ resistance: ohm(r), reactance: ohm(x) })),
    }),
  )

const anySlip = fc.oneof(draw(-2, 2), fc.constantFrom(0, 1, -1, 1e-6, -1e-6))

/** Power per phase and volt squared in each resistor of the circuit, solved branch by branch with an independent library. */
function lossesBy(each: InductionCircuit, slip: number) {
  const j = (x: number) => math.complex(0, x)
  const rotor = each.cages.map(({ resistance, reactance }) =>
    math.divide(slip, math.add(resistance, j(slip * reactance))),
  ) as math.Complex[]
  const core = each.core === null ? 0 : 1 / each.core
  const inner = rotor.reduce(
    (sum, y) => math.add(sum, y) as math.Complex,
    math.add(core, math.divide(1, j(each.magnetising))) as math.Complex,
  )
  const total = math.add(
    math.complex(each.stator.re, each.stator.im),
    math.divide(1, inner) as math.Complex,
  ) as math.Complex
  const current = math.divide(1, total) as math.Complex
  const airgapVoltage = math.divide(current, inner) as math.Complex
  const square = (x: math.Complex) => (math.abs(x) as unknown as number) ** 2
  const cages = rotor.map((y, index) => {
    const share = math.multiply(airgapVoltage, y) as math.Complex
    return square(share) * each.cages[index]!.resistance
  })
  return {
    input: current,
    stator: square(current) * each.stator.re,
    core: square(airgapVoltage) * core,
    // Copper loss of the rotor, and what is left of the airgap power for the shaft: (1 − s)/s times it.
    rotor: cages.reduce((sum, loss) => sum + loss, 0),
  }
}

describe('an induction machine', () => {
  it('balances power at every slip: input = stator + core + airgap, and rotor loss = slip × airgap', () => {
    fc.assert(
      fc.property(circuit, anySlip, (each, slip) => {
        const state = atSlip(each, slip)
        const losses = lossesBy(each, slip)
        const airgap = state.airgapPerVoltSquared
        expect(state.admittance.re).toBeCloseTo(losses.stator + losses.core + airgap, 10)
        expect(losses.rotor).toBeCloseTo(slip * airgap, 10)
      }),
    )
  })

  it('draws the current of its circuit solved branch by branch', () => {
    fc.assert(
      fc.property(
        circuit,
        anySlip.filter((slip) => slip !== 0),
        (each, slip) => {
          const { admittance } = atSlip(each, slip)
          const { input } = lossesBy(each, slip)
          expect(admittance.re).toBeCloseTo(input.re, 10)
          expect(admittance.im).toBeCloseTo(input.im, 10)
        },
      ),
    )
  })

  it('has no torque at synchronous speed, where it draws only its magnetising current and losses', () => {
    fc.assert(
      fc.property(circuit, (each) => {
        const state = atSlip(each, 0)
        expect(state.airgapPerVoltSquared).toBe(0)
        expect(state.admittance.im).toBeLessThan(0)
        const no = each.core === null ? 0 : 1 / each.core
        expect(state.admittance.re).toBeLessThan(no + 0.1)
      }),
    )
  })

  it('is a generator above synchronous speed', () => {
    fc.assert(
      fc.property(circuit, draw(0.001, 0.05), (each, slip) => {
        expect(atSlip(each, -slip).airgapPerVoltSquared).toBeLessThan(0)
        expect(atSlip(each, slip).airgapPerVoltSquared).toBeGreaterThan(0)
      }),
    )
  })

  it('has torque as the square of the voltage', () => {
    const state = atSlip(
      {
        stator: { re: ohm(0.01), im: ohm(0.1) },
        magnetising: ohm(3),
        core: null,
        cages: [{ resistance: ohm(0.02), reactance: ohm(0.1) }],
      },
      0.5,
    )
    const synchronous = radianPerSecond(157)
    expect(torqueAt(state, 0.8, synchronous) / torqueAt(state, 1, synchronous)).toBeCloseTo(0.64, 12)
  })

  it('in a table is what it is alone, whatever stands beside it', () => {
    fc.assert(
      fc.property(fc.array(circuit, { minLength: 1, maxLength: 4 }), anySlip, (circuits, slip) => {
        const table = machineTable(circuits)
        circuits.forEach((each, i) => {
          evaluateMachine(table, i, slip)
          const alone = atSlip(each, slip)
          expect(table.admittance[2 * i]).toBe(alone.admittance.re)
          expect(table.admittance[2 * i + 1]).toBe(alone.admittance.im)
          expect(table.airgap[i]).toBe(alone.airgapPerVoltSquared)
        })
      }),
    )
  })
})

const singleCage = circuit.filter(({ cages, core }) => cages.length === 1 && core === null)

/** Thevenin of the stator seen from the rotor: impedance and voltage at 1 V. */
function thevenin({ stator, magnetising }: InductionCircuit) {
  const square = stator.re ** 2 + (stator.im + magnetising) ** 2
  return {
    r: (magnetising ** 2 * stator.re) / square,
    x: (magnetising * (stator.re ** 2 + stator.im * (stator.im + magnetising))) / square,
    v: magnetising / Math.sqrt(square),
  }
}

describe('breakdown', () => {
  it('of a single cage lies at s_b = R_r/√(R_th² + (X_th + X_r)²) with T_b = V_th²/(2ω_s(R_th + √…))', () => {
    fc.assert(
      fc.property(singleCage, (each) => {
        const { r, x, v } = thevenin(each)
        const rotor = each.cages[0]!
        const root = Math.hypot(r, x + rotor.reactance)
        const expected = rotor.resistance / root
        fc.pre(expected < 0.9)
        expect(breakdownSlip(each)).toBeCloseTo(expected, 6)
        expect(atSlip(each, expected).airgapPerVoltSquared).toBeCloseTo(v ** 2 / (2 * (r + root)), 9)
      }),
    )
  })

  it('gives Kloss’s exact curve T = 2T_b(1 + a·s_b)/(s/s_b + s_b/s + 2a·s_b) with a = R_th/R_r', () => {
    fc.assert(
      fc.property(singleCage, draw(0.002, 1), (each, slip) => {
        const { r, x } = thevenin(each)
        const rotor = each.cages[0]!
        const sb = rotor.resistance / Math.hypot(r, x + rotor.reactance)
        const a = r / rotor.resistance
        const most = atSlip(each, sb).airgapPerVoltSquared
        const kloss = (2 * most * (1 + a * sb)) / (slip / sb + sb / slip + 2 * a * sb)
        expect(atSlip(each, slip).airgapPerVoltSquared / kloss).toBeCloseTo(1, 9)
      }),
    )
  })

  it('is the first maximum below synchronous speed even where the outer cage gives more at standstill', () => {
    const strongOuter: InductionCircuit = {
      stator: { re: ohm(0.01), im: ohm(0.06) },
      magnetising: ohm(3),
      core: null,
      cages: [
        { resistance: ohm(0.008), reactance: ohm(0.3) },
        { resistance: ohm(0.25), reactance: ohm(0.02) },
      ],
    }
    const slip = breakdownSlip(strongOuter)
    expect(slip).toBeLessThan(0.1)
    const near = (factor: number) => atSlip(strongOuter, slip * factor).airgapPerVoltSquared
    expect(near(1)).toBeGreaterThan(near(0.98))
    expect(near(1)).toBeGreaterThan(near(1.02))
    expect(atSlip(strongOuter, 1).airgapPerVoltSquared).toBeGreaterThan(near(1))
  })

  it('is at standstill for a rotor of so much resistance that torque rises all the way', () => {
    const slipRing: InductionCircuit = {
      stator: { re: ohm(0.01), im: ohm(0.06) },
      magnetising: ohm(3),
      core: null,
      cages: [{ resistance: ohm(0.5), reactance: ohm(0.1) }],
    }
    expect(breakdownSlip(slipRing)).toBe(1)
  })
})
