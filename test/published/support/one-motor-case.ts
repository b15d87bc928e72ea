import type { CaseInput, LoadCurve, MotorInput, Starter } from '@/lib/engine/case-input'
import type { StartResult } from '@/lib/engine/case-result'
import { runCase } from '@/lib/engine/run-case'
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
import { synchronousSpeed } from '@/lib/units/speed'
import type { TextbookMachine } from './at-terminals'

export interface OneMotor extends TextbookMachine {
  /** Voltage of the source; the machine's own where it is not given. */
  supply?: number
  starter?: Starter
  load?: LoadCurve
  /** kg·m² */
  inertia?: number
  /** rad/s; 0.99 of synchronous speed where the text gives none. */
  ratedSpeed?: number
  /** N·m */
  ratedTorque?: number
  criterion?: number
  timeLimit?: number
}

export const direct: Starter = { kind: 'direct' }

/** An ideal autotransformer that stays on its tap. */
export const onTap = (tap: number): Starter => ({
  kind: 'autotransformer',
  tap: perUnit(tap),
  impedance: { re: ohm(0), im: ohm(0) },
  changeOver: { kind: 'time', at: second(1e6) },
  gap: second(0),
})

/** A star-delta starter that stays in star. */
export const inStar: Starter = { kind: 'star-delta', changeOver: { kind: 'time', at: second(1e6) }, gap: second(0) }

/** A series impedance (Ω) that stays in. */
export const behind = (kind: 'reactor' | 'resistor', size: number): Starter => ({
  kind,
  impedance: { re: ohm(kind === 'resistor' ? size : 0), im: ohm(kind === 'reactor' ? size : 0) },
  changeOver: { kind: 'time', at: second(1e6) },
})

/** A load that no motor here can move: the rotor stays locked. */
export const locked: LoadCurve = {
  kind: 'power',
  constant: newtonMetre(1e9),
  atRated: newtonMetre(1e9),
  ratedSpeed: radianPerSecond(100),
  exponent: 1,
  breakaway: null,
}

export const noLoad: LoadCurve = { ...locked, constant: newtonMetre(0), atRated: newtonMetre(0) }

export const motorOf = (one: OneMotor, busId: string): MotorInput => {
  const ratedSpeed = one.ratedSpeed ?? 0.99 * synchronousSpeed(hertz(one.frequency), one.poles)
  const ratedTorque = one.ratedTorque ?? 1000
  return {
    id: 'M',
    busId,
    ratedVoltage: volt(one.voltage),
    ratedPower: watt(ratedTorque * ratedSpeed),
    ratedSpeed: radianPerSecond(ratedSpeed),
    ratedTorque: newtonMetre(ratedTorque),
    poles: one.poles,
    circuit: one.circuit,
    torqueFactor: perUnit(1),
    inertia: kilogramSquareMetre(one.inertia ?? 1),
    duty: {
      kind: 'starting',
      at: second(0),
      starter: one.starter ?? direct,
      load: one.load ?? locked,
      processLoad: null,
    },
    declared: { lockedRotorCurrent: null, lockedRotorTorque: null, permissibleTime: null },
  }
}

/** The motor alone on a source of a nano-ohm: the constant voltage of a textbook. */
export const oneMotorCase = (one: OneMotor): CaseInput => ({
  id: 'one-motor',
  frequency: hertz(one.frequency),
  buses: [{ id: 'B', nominal: volt(one.voltage) }],
  supply: {
    busId: 'B',
    impedance: { re: ohm(0), im: ohm(1e-9) },
    hold: { kind: 'emf', voltage: volt(one.supply ?? one.voltage) },
    motorsInLevel: [],
  },
  transformers: [],
  lines: [],
  loads: [],
  capacitors: [],
  motors: [motorOf(one, 'B')],
  settings: {
    speedCriterion: perUnit(one.criterion ?? 0.98),
    timeLimit: second(one.timeLimit ?? 60),
    tolerance: 1e-8,
  },
})

/** The start of that motor as the engine computes it. */
export const startOf = (one: OneMotor): StartResult => {
  const { outcome, motors } = runCase(oneMotorCase(one))
  const start = motors[0]?.start
  if (outcome.kind !== 'complete' || !start) throw new Error(`the run ended as ${JSON.stringify(outcome)}`)
  return start
}
