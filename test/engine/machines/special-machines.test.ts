import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { InductionCircuit, TabulatedMachine } from '@/lib/engine/case-input'
import { atSlip } from '@/lib/engine/machines/at-slip'
import { barReactanceFactor, barResistanceFactor } from '@/lib/engine/machines/deep-bar'
import { evaluateMachine, isOutside, machineTable } from '@/lib/engine/machines/machine-table'
import { saturate } from '@/lib/engine/machines/saturation'
import { runCase } from '@/lib/engine/run-case'
import { ampere, newtonMetre, ohm, radianPerSecond, volt } from '@/lib/units/si'
import { simpleMotor, simplePlant, squareLoad, started } from '../../support/simple-plant'

const circuit: InductionCircuit = {
  stator: { re: ohm(0.05), im: ohm(0.5) },
  magnetising: ohm(15),
  core: ohm(300),
  cages: [{ resistance: ohm(0.06), reactance: ohm(0.6) }],
}
const synchronous = 100 * Math.PI

describe('a deep-bar rotor', () => {
  const deep: InductionCircuit = { ...circuit, deepBar: { law: 'linear', resistance: ohm(0.2), reactance: ohm(0.35) } }
  const withCage = (r: number, x: number): InductionCircuit => ({
    ...circuit,
    cages: [{ resistance: ohm(r), reactance: ohm(x) }],
  })

  it('is the shallow one with the values of each slip', () => {
    for (const slip of [-1.4, -0.3, 0, 0.2, 0.75, 1, 1.6]) {
      const share = Math.min(1, Math.abs(slip))
      expect(atSlip(deep, slip)).toEqual(atSlip(withCage(0.06 + 0.14 * share, 0.6 - 0.25 * share), slip))
    }
  })

  it('has no torque at synchronous speed and as much airgap power as input less losses at any other', () => {
    for (const model of [deep, { ...circuit, deepBar: { law: 'bar' as const, depth: 3, slotShare: 0.6 } }])
      fc.assert(
        fc.property(fc.double({ min: -2, max: 2, noNaN: true }), (slip) => {
          const { admittance, airgapPerVoltSquared } = atSlip(model, slip)
          const square = admittance.re ** 2 + admittance.im ** 2
          const stator = square * circuit.stator.re
          // Voltage behind the stator: 1 − Z_s·y.
          const re = 1 - (circuit.stator.re * admittance.re - circuit.stator.im * admittance.im)
          const im = -(circuit.stator.re * admittance.im + circuit.stator.im * admittance.re)
          const core = (re * re + im * im) / circuit.core!
          expect(airgapPerVoltSquared).toBeCloseTo(admittance.re - stator - core, 12)
          if (slip === 0) expect(airgapPerVoltSquared).toBeCloseTo(0, 15)
        }),
      )
  })

  it('by the law of the bar: nearly ξ times the resistance and 3/2ξ of the slot reactance when deep', () => {
    // Limits of the closed forms for ξ ≫ 1 and their series for ξ ≪ 1: common practice, no source.
    expect(barResistanceFactor(4)).toBeCloseTo(4, 2)
    expect(barReactanceFactor(4)).toBeCloseTo(1.5 / 4, 2)
    expect(barResistanceFactor(0.5)).toBeCloseTo(1 + (4 / 45) * 0.5 ** 4, 4)
    expect(barReactanceFactor(0.5)).toBeCloseTo(1 - (8 / 315) * 0.5 ** 4, 4)
    expect(barResistanceFactor(0.02)).toBeCloseTo(barResistanceFactor(0.0200001), 10)
    expect(barResistanceFactor(0)).toBe(1)
  })
})

const table: TabulatedMachine = {
  voltage: volt(6000),
  speeds: [0, 100, 250, 300, synchronous].map(radianPerSecond),
  torques: [4000, 4200, 9000, 8000, 0].map(newtonMetre),
  currents: [600, 580, 400, 250, 35].map(ampere),
  powerFactors: [0.2, 0.24, 0.5, 0.7, 0.08],
  interpolation: 'linear',
}

describe('a machine by its curves', () => {
  it('has the typed torque, current and power factor at its points', () => {
    table.speeds.forEach((speed, k) => {
      const { admittance, airgapPerVoltSquared } = atSlip(table, 1 - speed / synchronous, synchronous)
      const size = Math.hypot(admittance.re, admittance.im)
      expect((airgapPerVoltSquared * 6000 ** 2) / synchronous).toBeCloseTo(table.torques[k]!, 6)
      expect((size * 6000) / Math.sqrt(3)).toBeCloseTo(table.currents[k]!, 9)
      expect(admittance.re / size).toBeCloseTo(table.powerFactors[k]!, 12)
      expect(admittance.im).toBeLessThan(0)
    })
  })

  it('does not reach beyond standstill or synchronous speed', () => {
    const machines = machineTable([table], [synchronous])
    expect([1, 0.5, 0].map((slip) => isOutside(machines, 0, slip))).toEqual([false, false, false])
    expect([1.01, -0.01].map((slip) => isOutside(machines, 0, slip))).toEqual([true, true])
  })

  it('may give the torque alone, current and power factor being the circuit’s', () => {
    const { voltage, speeds, torques, interpolation } = table
    const hybrid: InductionCircuit = { ...circuit, torqueCurve: { voltage, speeds, torques, interpolation } }
    for (const slip of [1, 0.6, 0.1]) {
      const [both, alone, typed] = [hybrid, circuit, table].map((model) => atSlip(model, slip, synchronous))
      expect(both!.admittance).toEqual(alone!.admittance)
      expect(both!.airgapPerVoltSquared).toBe(typed!.airgapPerVoltSquared)
    }
  })
})

describe('leakage saturation', () => {
  const saturation = { current: 1.1, torque: 2.25, noneBelow: 0.01, fullFrom: 0.08 }
  const at = (slip: number, voltage: number) => {
    const machines = machineTable([circuit])
    evaluateMachine(machines, 0, slip)
    const [re, im, airgap] = [machines.admittance[0]!, machines.admittance[1]!, machines.airgap[0]!]
    saturate(machines, 0, saturation, slip, voltage)
    return {
      current: Math.hypot(machines.admittance[0]!, machines.admittance[1]!) / Math.hypot(re, im),
      torque: machines.airgap[0]! / airgap,
      input: machines.admittance[0]!,
      plainInput: re,
      airgap: machines.airgap[0]!,
      plainAirgap: airgap,
    }
  }

  it('lowers current and torque at standstill by their powers of the voltage beyond 1 and 2', () => {
    const { current, torque } = at(1, 0.65)
    expect(current).toBeCloseTo(0.65 ** 0.1, 12)
    expect(torque).toBeCloseTo(0.65 ** 0.25, 12)
  })

  it('keeps the input equal to airgap power and losses that go with the square of the current', () => {
    const { current, input, plainInput, airgap, plainAirgap } = at(0.5, 0.7)
    expect(input).toBeCloseTo(airgap + (plainInput - plainAirgap) * current ** 2, 12)
  })

  it('raises nothing above rated voltage and is gone at running speed', () => {
    expect(at(1, 1.08)).toMatchObject({ current: 1, torque: 1 })
    expect(at(0.008, 0.8)).toMatchObject({ current: 1, torque: 1 })
  })

  it('fades in between', () => {
    const torques = [0.01, 0.03, 0.06, 0.08].map((slip) => at(slip, 0.7).torque)
    expect(torques.toSorted((a, b) => b - a)).toEqual(torques)
  })

  it('makes a start on a weak supply slower, and its dip a little less deep', () => {
    const plain = simpleMotor('M', started({ kind: 'direct' }, squareLoad(300)))
    const share = { ...saturation, noneBelow: 0.02, fullFrom: 0.2 }
    const saturated = { ...plain, circuit: { ...plain.circuit, saturation: share } }
    const [without, with_] = [plain, saturated].map((motor) => runCase(simplePlant([motor], 0.02)))
    expect(with_!.outcome).toEqual({ kind: 'complete' })
    expect(with_!.counters.largestMismatch).toBeLessThan(1e-9)
    const time = (result: typeof without) => result!.motors[0]!.start!.timeToCriterion!
    expect(time(with_)).toBeGreaterThan(time(without))
    expect(with_!.places[0]!.first).toBeGreaterThan(without!.places[0]!.first)
  })
})

describe('a run with a machine by its curves', () => {
  const motor = simpleMotor('M', started({ kind: 'direct' }, squareLoad(300)))
  const speed = (4 * Math.PI * 50) / motor.poles
  const model: TabulatedMachine = {
    voltage: motor.ratedVoltage,
    speeds: [0, 0.5, 0.8, 0.95, 1].map((part) => radianPerSecond(part * speed)),
    torques: [1.2, 1.3, 1.9, 2.4, 0].map((part) => newtonMetre(part * motor.ratedTorque)),
    currents: [6, 5.6, 4.8, 3, 0.3].map((part) =>
      ampere((part * motor.ratedPower) / (Math.sqrt(3) * motor.ratedVoltage * 0.8)),
    ),
    powerFactors: [0.2, 0.25, 0.4, 0.7, 0.1],
    interpolation: 'linear',
  }

  it('starts, and takes the time that the areas of its straight lines say', () => {
    const stiff = simplePlant([{ ...motor, circuit: model }], 1e-6)
    const { start } = runCase(stiff).motors[0]!
    const u = runCase(stiff).places[0]!.before / motor.ratedVoltage
    const goal = 0.98 * motor.ratedSpeed
    let [time, steps] = [0, 20_000]
    const load = (n: number) => 300 * (n / motor.ratedSpeed) ** 2
    const torque = (n: number) => {
      const k = model.speeds.findIndex((each, i) => i > 0 && n <= each)
      const [a, b] = [model.speeds[k - 1]!, model.speeds[k]!]
      return (model.torques[k - 1]! + ((model.torques[k]! - model.torques[k - 1]!) * (n - a)) / (b - a)) * u * u
    }
    for (let k = 0; k < steps; k++) {
      const n = ((k + 0.5) * goal) / steps
      time += (motor.inertia * goal) / steps / (torque(n) - load(n))
    }
    expect(start!.timeToCriterion! / time).toBeCloseTo(1, 4)
  })

  it('is refused where the curves do not go from standstill to synchronous speed', () => {
    const short = { ...model, speeds: model.speeds.map((each) => radianPerSecond(each * 0.99)) }
    expect(runCase(simplePlant([{ ...motor, circuit: short }], 0.01)).outcome).toMatchObject({
      kind: 'refused',
      cause: 'bad-value',
    })
  })
})
