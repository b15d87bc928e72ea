import { describe, expect, it } from 'vitest'
import { type CaseInput, circuitOf } from '@/lib/engine/case-input'
import { atSlip } from '@/lib/engine/machines/at-slip'
import { runCase } from '@/lib/engine/run-case'
import { beforeStart } from '@/lib/engine/runup/before-start'
import { preparePlant } from '@/lib/engine/runup/plant'
import { sourceImpedance } from '@/lib/engine/runup/supply'
import { ohm, perUnit, siemens, volt, voltAmpere } from '@/lib/units/si'
import {
  constantLoad,
  noLoad,
  simpleMotor,
  simplePlant,
  singleCage,
  squareLoad,
  started,
} from '../../support/simple-plant'
import {
  boosterMotor,
  boosterRunning,
  direct,
  lastPump,
  pump,
  running,
  valveOpen,
  velmoorCase,
} from '../../support/velmoor'

const held = (voltage: number, input: CaseInput): CaseInput => ({
  ...input,
  supply: { ...input.supply, hold: { kind: 'bus-voltage', voltage: volt(voltage) } },
})

const load = (p: number, q: number, mix = { impedance: 0.2, current: 0.3, power: 0.5 }) => ({
  id: 'L',
  busId: 'B',
  power: { re: voltAmpere(p), im: voltAmpere(q) },
  ratedVoltage: volt(400),
  mix,
  floor: perUnit(0),
})

function stateBefore(input: CaseInput) {
  const plant = preparePlant(input)
  if (!plant.ok) throw new Error(JSON.stringify(plant.outcome))
  const found = beforeStart(plant.value)
  if (!found.ok) throw new Error(JSON.stringify(found.outcome))
  return found.value
}

describe('a held voltage at the supply’s bus', () => {
  it('is there before the start, whatever runs at that bus', () => {
    const input = held(
      390,
      simplePlant([simpleMotor('R', { kind: 'running', load: squareLoad(1200) }), simpleMotor('M', started())], 0.01, {
        loads: [load(2e5, 1e5)],
      }),
    )
    expect(runCase(input).places[0]!.before).toBeCloseTo(390, 9)
  })

  it('gives the EMF that as an open-circuit voltage gives the same case', () => {
    const input = velmoorCase('held', 'weakest', lastPump(direct))
    const result = runCase(input)
    const again = runCase({
      ...input,
      supply: { ...input.supply, hold: { kind: 'emf', voltage: result.supply!.emf } },
    })
    expect(again.places[0]!.before).toBeCloseTo(32400, 4)
    result.places.forEach((place, b) => {
      expect(again.places[b]!.before / place.before).toBeCloseTo(1, 9)
      expect(again.places[b]!.deepest.voltage / place.deepest.voltage).toBeCloseTo(1, 8)
    })
    expect(again.motors[3]!.start!.timeToCriterion).toBeCloseTo(result.motors[3]!.start!.timeToCriterion!, 6)
  })

  it('is the EMF itself when nothing is drawn', () => {
    expect(runCase(held(405, simplePlant([simpleMotor('M', started())]))).supply!.emf).toBeCloseTo(405, 9)
  })

  it('lies below the EMF by the drop of the load current in the source', () => {
    const p = 2e5
    const input = held(400, simplePlant([], 0.02, { loads: [load(p, 0, { impedance: 0, current: 0, power: 1 })] }))
    const current = p / 400
    expect(runCase(input).supply!.emf).toBeCloseTo(Math.hypot(400 + 0.002 * current, 0.02 * current), 8)
  })

  it('may be held where a capacitor lifts the plant above the EMF', () => {
    const input = held(400, simplePlant([], 0.02, { capacitors: [{ id: 'K', busId: 'B', susceptance: siemens(2) }] }))
    const { emf, powerBefore } = runCase(input).supply!
    expect(emf).toBeLessThan(400)
    expect(powerBefore.im).toBeCloseTo(-2 * 400 ** 2, 3)
  })
})

describe('running motors before the start', () => {
  it('balance their torque with that of their load at the voltage they have', () => {
    const { system, speeds } = stateBefore(velmoorCase('held', 'weakest', lastPump(direct)))
    for (const i of [0, 1, 2, 4]) {
      expect(Math.abs(system.balance(i, speeds[i]!)) / system.plant.ratedTorque[i]!).toBeLessThan(1e-9)
      expect(speeds[i]!).toBeGreaterThan(system.plant.breakdownSpeed[i]!)
    }
    expect(speeds[3]).toBe(0)
  })

  it('run at synchronous speed without load', () => {
    const { system, speeds } = stateBefore(simplePlant([simpleMotor('R', { kind: 'running', load: noLoad })]))
    expect(speeds[0]).toBeCloseTo(system.plant.synchronous[0]!, 9)
  })

  it('share the voltage: with more of them each has more slip', () => {
    const slipOf = (count: number) => {
      const motors = Array.from({ length: count }, (_, i) =>
        simpleMotor(`R${i}`, { kind: 'running', load: constantLoad(1000) }),
      )
      return 1 - stateBefore(simplePlant(motors, 0.02)).speeds[0]! / (50 * Math.PI)
    }
    expect(slipOf(2)).toBeGreaterThan(slipOf(1))
    expect(slipOf(3)).toBeGreaterThan(slipOf(2))
  })

  it('find no balance where together they pull each other out, though each alone would run', () => {
    const motors = (count: number) =>
      Array.from({ length: count }, (_, i) => simpleMotor(`R${i}`, { kind: 'running', load: constantLoad(1250) }))
    expect(runCase(simplePlant(motors(1), 0.06)).outcome.kind).toBe('complete')
    expect(runCase(simplePlant(motors(4), 0.06)).outcome).toEqual({ kind: 'no-load-flow', busId: 'B' })
  })

  it('take from the supply what they, the loads and the losses between need', () => {
    const { power, system } = stateBefore(velmoorCase('held', 'weakest', lastPump(direct)))
    const shaft = [0, 1, 2, 4].reduce((sum, i) => sum + system.torque[i]! * system.plant.synchronous[i]!, 0)
    expect(power.re).toBeGreaterThan(shaft + 0.45e6 * 0.95)
    expect(power.re).toBeLessThan(1.06 * (shaft + 0.45e6))
  })
})

describe('a stated level that contains the plant’s motors', () => {
  const withMotors = (count: number): CaseInput => {
    const input = velmoorCase('level', 'weakest', lastPump(direct))
    const circuit = circuitOf(pump(1, running(valveOpen)).circuit)
    return {
      ...input,
      supply: {
        ...input.supply,
        motorsInLevel: Array.from({ length: count }, (_, i) => ({ busId: `M${i + 1}`, circuit })),
      },
    }
  }
  const source = (count: number) => {
    const plant = preparePlant(withMotors(count))
    if (!plant.ok) throw new Error('refused')
    const found = sourceImpedance(plant.value)
    if (!found.ok) throw new Error('refused')
    return found.value
  }

  it('leaves the impedance alone when there are none', () => {
    expect(source(0).impedance).toEqual(withMotors(0).supply.impedance)
    expect(source(0).takenOut).toBeNull()
  })

  it('is lowered by their locked-rotor admittance behind cable and transformer: of one motor on paper', () => {
    const motor = atSlip(circuitOf(pump(1, running(valveOpen)).circuit), 1).admittance
    const zm = 1 / Math.hypot(motor.re, motor.im)
    const { impedance, takenOut } = source(1)
    // 7.446 MVA at 6.6 kV; 33 kV at the PCC stand for 6.9 kV, less what cable, transformer and line take.
    expect(zm).toBeCloseTo(5.85, 2)
    expect(takenOut!).toBeGreaterThan(7.4e6)
    expect(takenOut!).toBeLessThan(7.446e6 * (6.9 / 6.6) ** 2)
    expect(Math.hypot(impedance.re, impedance.im)).toBeGreaterThan(
      Math.hypot(...Object.values(withMotors(0).supply.impedance)),
    )
    const level = 33000 ** 2 / Math.hypot(impedance.re, impedance.im)
    expect(level).toBeGreaterThan(90e6 - takenOut!)
    expect(level).toBeLessThan(90e6 - 0.8 * takenOut!)
  })

  it('is said with the power taken out', () => {
    const result = runCase(withMotors(3))
    expect(result.notices).toContainEqual({ kind: 'levels-motors-taken-out', level: source(3).takenOut })
    expect(result.supply!.impedance).toEqual(source(3).impedance)
  })

  it('makes the dip deeper than the level as stated', () => {
    const deepest = (count: number) => runCase(withMotors(count)).places[0]!.deepest.voltage
    expect(deepest(3)).toBeLessThan(deepest(0))
  })

  it('is refused when nothing remains for the supply', () => {
    const input = simplePlant([simpleMotor('M', started())], 0.15)
    const motorsInLevel = [1, 2].map(() => ({ busId: 'B', circuit: singleCage }))
    const result = runCase({ ...input, supply: { ...input.supply, motorsInLevel } })
    expect(result.outcome).toMatchObject({ kind: 'refused', cause: 'bad-value', buses: ['B'] })
  })

  it('does not count the booster’s static neighbours: loads and capacitor do not feed a short circuit', () => {
    const plain = source(2).impedance
    const plant = preparePlant({ ...withMotors(2), capacitors: [], loads: [] })
    if (!plant.ok) throw new Error('refused')
    const bare = sourceImpedance(plant.value)
    expect(bare.ok && bare.value.impedance).toEqual(plain)
    expect(boosterMotor(running(boosterRunning)).ratedVoltage).toBe(400)
  })
})

describe('the network before the start', () => {
  it('joins buses without impedance between them into one voltage', () => {
    const input = simplePlant([simpleMotor('M', started(), { busId: 'C' })], 0.01, {
      buses: ['B', 'C', 'D'].map((id) => ({ id, nominal: volt(400) })),
      lines: [
        { id: '1', fromBusId: 'B', toBusId: 'C', impedance: { re: ohm(0), im: ohm(0) }, susceptance: siemens(0) },
        { id: '2', fromBusId: 'C', toBusId: 'D', impedance: { re: ohm(0.01), im: ohm(0.01) }, susceptance: siemens(0) },
      ],
    })
    const { places } = runCase(input)
    expect(places[1]!.deepest.voltage).toBe(places[0]!.deepest.voltage)
    expect(places[2]!.deepest.voltage).toBeCloseTo(places[0]!.deepest.voltage, 9)
  })

  it('lifts the end of an unloaded line with charging above its beginning', () => {
    const line = { id: '1', fromBusId: 'B', toBusId: 'C', impedance: { re: ohm(0.1), im: ohm(0.5) } }
    const input = (susceptance: number) =>
      simplePlant([], 0.01, {
        buses: ['B', 'C'].map((id) => ({ id, nominal: volt(400) })),
        lines: [{ ...line, susceptance: siemens(susceptance) }],
      })
    const lifted = runCase(input(0.02)).places
    // V_C = V_B/(1 + Z·jB/2).
    expect(lifted[1]!.before / lifted[0]!.before).toBeCloseTo(1 / Math.hypot(1 - 0.5 * 0.01, 0.1 * 0.01), 9)
    expect(runCase(input(0)).places[1]!.before).toBeCloseTo(400, 9)
  })
})
