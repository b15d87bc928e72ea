import type { CaseInput, InductionCircuit, LoadCurve, MotorInput, Starter } from '@/lib/engine/case-input'
import {
  hertz,
  kilogramSquareMetre,
  newtonMetre,
  ohm,
  perUnit,
  radianPerSecond,
  second,
  volt,
  watt,
} from '@/lib/units/si'
import { fromRpm } from '@/lib/units/speed'

/** The smallest plant: one bus of 400 V behind a supply, with motors of 200 kW and four poles. */

export const singleCage: InductionCircuit = {
  stator: { re: ohm(0.0099), im: ohm(0.0595) },
  magnetising: ohm(2.115),
  core: null,
  cages: [{ resistance: ohm(0.00925), reactance: ohm(0.0661) }],
}

export const noLoad: Extract<LoadCurve, { kind: 'power' }> = {
  kind: 'power',
  constant: newtonMetre(0),
  atRated: newtonMetre(0),
  ratedSpeed: fromRpm(1480),
  exponent: 2,
  breakaway: null,
}

/** T₀ + (T_r − T₀)(n/1480)², N·m. */
export const squareLoad = (atRated: number, constant = 0): LoadCurve => ({
  ...noLoad,
  constant: newtonMetre(constant),
  atRated: newtonMetre(atRated),
})

export const constantLoad = (torque: number): LoadCurve => squareLoad(torque, torque)

export const started = (
  starter: Starter = { kind: 'direct' },
  load: LoadCurve = noLoad,
  at = 0,
): MotorInput['duty'] => ({
  kind: 'starting',
  at: second(at),
  starter,
  load,
  processLoad: null,
})

export const autotransformer = (tap: number, changeOver: { at: number } | { rpm: number }, gap = 0): Starter => ({
  kind: 'autotransformer',
  tap: perUnit(tap),
  impedance: { re: ohm(0), im: ohm(0) },
  changeOver:
    'at' in changeOver ? { kind: 'time', at: second(changeOver.at) } : { kind: 'speed', at: fromRpm(changeOver.rpm) },
  gap: second(gap),
})

export function simpleMotor(id: string, duty: MotorInput['duty'], changes: Partial<MotorInput> = {}): MotorInput {
  const ratedSpeed = fromRpm(1480)
  return {
    id,
    busId: 'B',
    ratedVoltage: volt(400),
    ratedPower: watt(200e3),
    ratedSpeed,
    ratedTorque: newtonMetre(200e3 / ratedSpeed),
    poles: 4,
    circuit: singleCage,
    torqueFactor: perUnit(1),
    inertia: kilogramSquareMetre(6),
    duty,
    declared: { lockedRotorCurrent: null, lockedRotorTorque: null, permissibleTime: null },
    ...changes,
  }
}

/** The plant with a source reactance (and a tenth of it as resistance) and an EMF of 400 V. */
export function simplePlant(
  motors: readonly MotorInput[],
  reactance = 0.009,
  changes: Partial<CaseInput> = {},
): CaseInput {
  return {
    id: 'simple',
    frequency: hertz(50),
    buses: [{ id: 'B', nominal: volt(400) }],
    supply: {
      busId: 'B',
      impedance: { re: ohm(reactance / 10), im: ohm(reactance) },
      hold: { kind: 'emf', voltage: volt(400) },
      motorsInLevel: [],
    },
    transformers: [],
    lines: [],
    loads: [],
    capacitors: [],
    motors,
    settings: { speedCriterion: perUnit(0.98), timeLimit: second(60), tolerance: 1e-8 },
    ...changes,
  }
}

/** Synchronous speed of the motors, rad/s. */
export const synchronous = radianPerSecond(50 * Math.PI)
