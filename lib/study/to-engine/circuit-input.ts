import { type InductionCircuit, isTabulated, type MachineModel } from '../../engine/case-input'
import { type EstimateOutcome, estimateCircuit } from '../../engine/estimate/estimate-circuit'
import { circuitsOnPlate } from '../../engine/estimate/same-plate'
import { ampere, newtonMetre, type Ohm, ohm } from '../../units/si'
import type { MotorRecord } from '../document/machine-records'
import type { MotorCircuit } from '../document/motor-circuit'
import { nameplateOf } from './nameplate-of-motor'

type TypedCircuit = Exclude<MotorCircuit, { kind: 'estimated' | 'table' }>

/** A typed circuit in ohm; per unit stands on the stated power and the motor's rated voltage. */
const typedCircuit = (circuit: TypedCircuit, ratedVoltage: number): InductionCircuit => {
  const base = circuit.scale.unit === 'ohm' ? 1 : ratedVoltage ** 2 / circuit.scale.base.si
  const inOhm = (value: number): Ohm => ohm(value * base)
  const cages = circuit.kind === 'double-cage' ? [circuit.inner, circuit.outer] : [circuit.cage]
  return {
    stator: { re: inOhm(circuit.stator.r), im: inOhm(circuit.stator.x) },
    magnetising: inOhm(circuit.magnetising),
    core: circuit.core === null ? null : inOhm(circuit.core),
    cages: cages.map(({ r, x }) => ({ resistance: inOhm(r), reactance: inOhm(x) })),
    ...(circuit.kind === 'deep-bar' && {
      deepBar: { law: 'linear', resistance: inOhm(circuit.locked.r), reactance: inOhm(circuit.locked.x) },
    }),
    ...(circuit.kind === 'slot-bar' && {
      deepBar: { law: 'bar', depth: circuit.depth, slotShare: circuit.slotShare },
    }),
  }
}

/** Estimates the circuit of a motor from its record; motors with the same plate are estimated once. */
export type CircuitEstimator = (motor: MotorRecord) => EstimateOutcome

export const circuitEstimator = (frequency: number): CircuitEstimator => {
  const known = new Map<string, EstimateOutcome>()
  return (motor) => {
    const plate = nameplateOf(motor, frequency)
    if (!plate) throw new RangeError(`motor ${motor.id} was not checked: its plate is not complete`)
    const key = JSON.stringify(plate)
    const outcome = known.get(key) ?? estimateCircuit(plate)
    known.set(key, outcome)
    return outcome
  }
}

/** The circuit that a motor is computed with, in ohm, null for curves; a plate that no motor can have gives the estimator's refusal. */
export const circuitInput = (
  motor: MotorRecord,
  estimate: CircuitEstimator,
): { ok: true; circuit: InductionCircuit | null } | { ok: false; detail: string } => {
  if (motor.circuit.kind === 'table') return { ok: true, circuit: null }
  if (motor.circuit.kind !== 'estimated')
    return { ok: true, circuit: typedCircuit(motor.circuit, motor.ratedVoltage.si) }
  const outcome = estimate(motor)
  return outcome.kind === 'estimated' ? { ok: true, circuit: outcome.circuit } : { ok: false, detail: outcome.detail }
}

/** Other circuits that meet the plate of a motor whose circuit is estimated; motors with the same plate are searched once. */
export const plateCircuits = (frequency: number): ((motor: MotorRecord) => readonly InductionCircuit[]) => {
  const known = new Map<string, readonly InductionCircuit[]>()
  return (motor) => {
    const plate = motor.circuit.kind === 'estimated' ? nameplateOf(motor, frequency) : null
    if (!plate) return []
    const key = JSON.stringify(plate)
    const circuits = known.get(key) ?? circuitsOnPlate(plate)
    known.set(key, circuits)
    return circuits
  }
}

/** The machine with every admittance multiplied, for example by 1.2 for a locked-rotor current at +20 %. */
export const scaleAdmittance = (model: MachineModel, factor: number): MachineModel => {
  if (factor === 1) return model
  if (isTabulated(model))
    return {
      ...model,
      torques: model.torques.map((torque) => newtonMetre(torque * factor)),
      currents: model.currents.map((current) => ampere(current * factor)),
    }
  const scaled = (value: Ohm): Ohm => ohm(value / factor)
  const { deepBar } = model
  return {
    ...model,
    stator: { re: scaled(model.stator.re), im: scaled(model.stator.im) },
    magnetising: scaled(model.magnetising),
    core: model.core === null ? null : scaled(model.core),
    cages: model.cages.map(({ resistance, reactance }) => ({
      resistance: scaled(resistance),
      reactance: scaled(reactance),
    })),
    ...(deepBar?.law === 'linear' && {
      deepBar: { ...deepBar, resistance: scaled(deepBar.resistance), reactance: scaled(deepBar.reactance) },
    }),
  }
}
