import { synchronousSpeed } from '../../units/speed'
import type { CaseInput, MotorInput } from '../case-input'
import type { CaseResult } from '../case-result'
import { onGenerator } from '../generator-input'
import { residualDecayTime } from '../machines/residual-voltage'
import { hasFluxes } from '../runup/flux-model'
import type { RuleInput } from './rule'

type Motors = Pick<CaseResult, 'motors' | 'model'>

/** A gap shorter than the residual voltage lasts; gaps of unknown machines always are. */
function isFast({ circuit }: MotorInput, gap: number, frequency: number): boolean {
  const decay = residualDecayTime(circuit, frequency)
  return decay === null || gap < decay
}

/** Gap without voltage in a start's change-over, s; 0 for none. */
function gapOf({ duty }: MotorInput): number {
  if (duty.kind !== 'starting') return 0
  const { starter } = duty
  return 'gap' in starter ? starter.gap : 0
}

/** Motors that still hold a voltage of their own when a supply that was away finds them on. */
function heldByResidual({ disturbance, motors, frequency }: CaseInput): readonly MotorInput[] {
  if (!disturbance || disturbance.remaining > 0) return []
  const { duration, decayTime } = disturbance
  const isSoon = (motor: MotorInput): boolean =>
    decayTime === undefined ? isFast(motor, duration, frequency) : duration < decayTime
  return motors.filter((motor) => {
    const { duty } = motor
    if (duty.kind !== 'running' || !isSoon(motor)) return false
    // A contactor that opens in the gap takes the motor off until it closes again.
    return !duty.contactor || duty.contactor.delay >= duration || duty.contactor.reclose !== null
  })
}

/** Motors whose contactors came back while they held a residual voltage. */
const reclosed = ({ motors, frequency }: CaseInput, result: Motors): readonly MotorInput[] =>
  motors.filter((motor) => {
    const outcome = result.motors.find(({ motorId }) => motorId === motor.id)?.running?.outcome
    return outcome?.kind === 're-accelerated' && isFast(motor, outcome.reclosedAt - outcome.droppedAt, frequency)
  })

/** Motors that the network closes on while they hold a residual voltage. */
const residualMotors = (input: CaseInput, result: Motors): readonly MotorInput[] => [
  ...heldByResidual(input),
  ...reclosed(input, result),
  ...input.motors.filter((motor) => {
    const gap = gapOf(motor)
    return gap > 0 && isFast(motor, gap, input.frequency)
  }),
]

/** Whether a case closes on residual voltages that the third-order model can follow, all of them. */
export function followsResidual(input: CaseInput, result: Motors): boolean {
  const motors = residualMotors(input, result)
  return motors.length > 0 && motors.every(hasFluxes) && !onGenerator(input)
}

/** Whether a start begins or goes on with a transient that the model of the case cannot show. */
function hidesTransient(input: CaseInput, result: Motors): boolean {
  const { model } = result
  if (model === 'fifth-order') return false
  const motors = [...residualMotors(input, result), ...input.motors.filter((motor) => cutsIn(motor, input))]
  return motors.some((motor) => model === 'quasi-static' || !hasFluxes(motor))
}

/** Slip within which a machine that is switched on counts as near synchronous speed. */
const nearSynchronous = 0.1

/** Whether a machine is switched on directly while it turns near synchronous speed: an induction generator, or a motor on a turning shaft. */
export function cutsIn({ duty, poles }: MotorInput, { frequency }: CaseInput): boolean {
  if (duty.kind !== 'starting' || duty.starter.kind !== 'direct') return false
  return Math.abs(1 - (duty.initialSpeed ?? 0) / synchronousSpeed(frequency, poles)) < nearSynchronous
}

/**
 * Whether a limit on voltage can be met in a transient model only: after a cut-in near synchronous speed, an open
 * transition or a supply that comes back on residual voltages. A quasi-static figure beyond the limit still fails it;
 * settled voltages, and the first instant of a start that has not yet come to its gap, are those of any model.
 */
export function onlyTransientJudges(rule: RuleInput, input: CaseInput, result: Motors): boolean {
  const { quantity, instant, limit } = rule
  if (quantity === 'flicker-short-term' || quantity === 'flicker-long-term') return hidesTransient(input, result)
  if (quantity !== 'voltage-change' && quantity !== 'remaining-voltage') return false
  if (instant === 'first' && limit.kind === 'value') {
    const cutting = input.motors.filter((motor) => cutsIn(motor, input))
    return cutting.length > 0 && hidesTransient({ ...input, motors: cutting }, result)
  }
  const settled = instant === 'settled-after-start' || instant === 'settled-after-process'
  return (limit.kind === 'envelope' || !settled) && hidesTransient(input, result)
}
