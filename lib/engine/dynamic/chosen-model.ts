import { type CaseInput, type CaseModel, isTabulated } from '../case-input'
import { cutsIn } from '../criteria/only-transient'
import { canBeFollowed } from '../transient/machine-equations'

/** Why a case cannot be computed by the fifth-order model; the quasi-static result then stands alone. */
export type UnfitCause =
  | 'several-starts'
  | 'device'
  | 'machine'
  | 'network'
  | 'schedule'
  | 'shaft'
  | 'no-start'
  | 'trip'

/** The model that a case asks for: where it says nothing, quasi-static, or fifth order for a machine that cuts in. */
export const chosenModel = (input: CaseInput): CaseModel => {
  if (input.model && input.model.kind !== 'quasi-static') return input.model
  return input.motors.some((motor) => cutsIn(motor, input))
    ? { kind: 'fifth-order', switchingAngle: null }
    : { kind: 'quasi-static' }
}

/** What keeps a case from the fifth-order model, before its network is looked at; null where nothing does. */
export function unfitFor(input: CaseInput): UnfitCause | null {
  const starting = input.motors.filter(({ duty }) => duty.kind === 'starting')
  const [motor] = starting
  if (motor?.duty.kind !== 'starting') return 'no-start'
  if (starting.length > 1) return 'several-starts'
  const { starter, attempts, capacitors, contactor } = motor.duty
  if (starter.kind !== 'direct' || (capacitors ?? []).length > 0) return 'device'
  if (input.disturbance || (attempts ?? []).length > 0 || contactor) return 'schedule'
  if (input.motors.some(({ duty }) => duty.kind === 'running' && duty.contactor)) return 'schedule'
  if (input.supply.generator) return 'network'
  const { circuit } = motor
  const plain = !isTabulated(circuit) && !circuit.torqueCurve && !circuit.saturation
  if (!plain || !canBeFollowed(circuit.cages, input.frequency)) return 'machine'
  if (motor.shaft !== undefined && input.motors.some((other) => other !== motor && other.shaft === motor.shaft))
    return 'shaft'
  return null
}
