import type { CaseInput, MotorInput } from '../case-input'
import { type Refusal, refuse } from '../network/refusal'

const positive = (value: number): boolean => Number.isFinite(value) && value > 0
const notNegative = (value: number): boolean => Number.isFinite(value) && value >= 0

const formerOf = ({ duty }: MotorInput): string | null =>
  duty.kind === 'starting' && duty.after ? duty.after.motorId : null

/** Whether the starts that one waits for lead back to itself. */
function waitsForItself(motor: MotorInput, motors: readonly MotorInput[]): boolean {
  let former = formerOf(motor)
  for (let step = 0; former !== null && step < motors.length; step++) {
    if (former === motor.id) return true
    const next = motors.find(({ id }) => id === former)
    former = next ? formerOf(next) : null
  }
  return false
}

function motorProblem(motor: MotorInput, motors: readonly MotorInput[]): string | null {
  const { duty } = motor
  if (duty.kind === 'running') {
    const { contactor } = duty
    if (!contactor) return null
    if (!positive(contactor.dropOut) || !notNegative(contactor.delay))
      return 'its contactor needs a drop-out voltage above zero and a delay of zero or more.'
    const { reclose } = contactor
    return reclose === null || (reclose.above >= contactor.dropOut && notNegative(reclose.delay))
      ? null
      : 'its contactor closes again at its drop-out voltage or above, after zero seconds or more.'
  }
  if (duty.contactor && !(positive(duty.contactor.dropOut) && notNegative(duty.contactor.delay)))
    return 'its contactor needs a drop-out voltage above zero and a delay of zero or more.'
  if (duty.attempts && !duty.attempts.every(({ runFor, rest }) => positive(runFor) && positive(rest)))
    return 'each attempt needs a time above zero, and a rest above zero before the next.'
  if (!duty.after) return null
  const { motorId, interval } = duty.after
  const former = motors.find(({ id }) => id === motorId)
  if (former?.duty.kind !== 'starting') return `it waits for ${motorId}, which is not started in this case.`
  if (!notNegative(interval)) return 'the interval after the former start must be zero or more.'
  return waitsForItself(motor, motors) ? 'its start waits for itself.' : null
}

/** The first thing in the order of starts and disturbances that no run can be made of, or null. */
export function checkSchedule({ motors, disturbance, supply }: CaseInput): Refusal | null {
  for (const motor of motors) {
    const problem = motorProblem(motor, motors)
    if (problem !== null) return refuse('bad-value', [motor.busId], `Motor ${motor.id}: ${problem}`).outcome
  }
  if (disturbance === undefined) return null
  const { at, duration, remaining } = disturbance
  if (notNegative(at) && positive(duration) && notNegative(remaining)) return null
  return refuse(
    'bad-value',
    [supply.busId],
    'A disturbance begins at zero or later, lasts some time and leaves zero or more of the voltage.',
  ).outcome
}
