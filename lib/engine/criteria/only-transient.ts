import { synchronousSpeed } from '../../units/speed'
import type { CaseInput, MotorInput } from '../case-input'
import type { CaseResult } from '../case-result'
import { residualDecayTime } from '../machines/residual-voltage'
import type { RuleInput } from './rule'

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

/** Whether a supply that was away finds motors that still hold a voltage of their own. */
function closesOnResidual({ disturbance, motors, frequency }: CaseInput): boolean {
  if (!disturbance || disturbance.remaining > 0) return false
  const { duration } = disturbance
  return motors.some((motor) => {
    const { duty } = motor
    if (duty.kind !== 'running' || !isFast(motor, duration, frequency)) return false
    // A contactor that opens in the gap takes the motor off until it closes again.
    return !duty.contactor || duty.contactor.delay >= duration || duty.contactor.reclose !== null
  })
}

/** Whether a case closes on residual voltages, which the third-order model follows. */
export const hasResidualTransient = (input: CaseInput): boolean =>
  closesOnResidual(input) ||
  input.motors.some((motor) => {
    const gap = gapOf(motor)
    return gap > 0 && isFast(motor, gap, input.frequency)
  })

/** Whether a start begins or goes on with a transient that RMS values of steady circuits cannot show. */
const hasTransient = (input: CaseInput): boolean =>
  hasResidualTransient(input) || input.motors.some((motor) => cutsIn(motor, input))

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
export function onlyTransientJudges(
  { quantity, instant, limit }: RuleInput,
  input: CaseInput,
  { model }: CaseResult,
): boolean {
  if (model !== 'quasi-static') return false
  if (quantity === 'flicker-short-term' || quantity === 'flicker-long-term') return hasTransient(input)
  if (quantity !== 'voltage-change' && quantity !== 'remaining-voltage') return false
  if (instant === 'first' && limit.kind === 'value') return input.motors.some((motor) => cutsIn(motor, input))
  const settled = instant === 'settled-after-start' || instant === 'settled-after-process'
  return (limit.kind === 'envelope' || !settled) && hasTransient(input)
}
