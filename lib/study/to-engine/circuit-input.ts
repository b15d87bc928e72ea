import type { InductionCircuit } from '../../engine/case-input'
import { type EstimateOutcome, estimateCircuit } from '../../engine/estimate/estimate-circuit'
import { type Ohm, ohm } from '../../units/si'
import type { MotorCircuit, MotorRecord } from '../document/machine-records'
import { nameplateOf } from './nameplate-of-motor'

type TypedCircuit = Exclude<MotorCircuit, { kind: 'estimated' }>

/** A typed circuit in ohm; per unit stands on the stated power and the motor's rated voltage. */
const typedCircuit = (circuit: TypedCircuit, ratedVoltage: number): InductionCircuit => {
  const base = circuit.scale.unit === 'ohm' ? 1 : ratedVoltage ** 2 / circuit.scale.base.si
  const inOhm = (value: number): Ohm => ohm(value * base)
  const cages = circuit.kind === 'single-cage' ? [circuit.cage] : [circuit.inner, circuit.outer]
  return {
    stator: { re: inOhm(circuit.stator.r), im: inOhm(circuit.stator.x) },
    magnetising: inOhm(circuit.magnetising),
    core: circuit.core === null ? null : inOhm(circuit.core),
    cages: cages.map(({ r, x }) => ({ resistance: inOhm(r), reactance: inOhm(x) })),
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

/** The circuit that a motor is computed with, in ohm; a plate that no motor can have gives the estimator's refusal. */
export const circuitInput = (
  motor: MotorRecord,
  estimate: CircuitEstimator,
): { ok: true; circuit: InductionCircuit } | { ok: false; detail: string } => {
  if (motor.circuit.kind !== 'estimated')
    return { ok: true, circuit: typedCircuit(motor.circuit, motor.ratedVoltage.si) }
  const outcome = estimate(motor)
  return outcome.kind === 'estimated' ? { ok: true, circuit: outcome.circuit } : { ok: false, detail: outcome.detail }
}

/** The circuit with every admittance multiplied, for example by 1.2 for a locked-rotor current at +20 %. */
export const scaleAdmittance = (circuit: InductionCircuit, factor: number): InductionCircuit => {
  if (factor === 1) return circuit
  const scaled = (value: Ohm): Ohm => ohm(value / factor)
  return {
    stator: { re: scaled(circuit.stator.re), im: scaled(circuit.stator.im) },
    magnetising: scaled(circuit.magnetising),
    core: circuit.core === null ? null : scaled(circuit.core),
    cages: circuit.cages.map(({ resistance, reactance }) => ({
      resistance: scaled(resistance),
      reactance: scaled(reactance),
    })),
  }
}
