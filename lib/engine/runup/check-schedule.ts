import type { CaseInput, MotorInput } from '../case-input'
import { generatorProblem } from '../machines/generator'
import { type Refusal, refuse } from '../network/refusal'
import type { Disturbance } from '../schedule-input'

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

function secondSupplyProblem({ remaining, to, decayTime }: Disturbance, onGenerator: boolean): string | null {
  if (decayTime !== undefined && !notNegative(decayTime))
    return 'The decay time of the residual voltage must be zero or more.'
  if (onGenerator && remaining !== 0)
    return 'A plant on a generator can lose its supply, but has no dip of the network.'
  if (to === undefined) return null
  if (remaining !== 0)
    return 'A plant goes over to another supply with none in between: nothing of the voltage remains.'
  const problem = to.generator ? generatorProblem(to.generator) : null
  if (problem !== null) return `The generator ${problem}`
  if (!positive(to.emf) || !Number.isFinite(to.angle))
    return 'The second supply needs a voltage above zero and an angle.'
  const { re, im } = to.impedance
  return to.generator || (notNegative(re) && Number.isFinite(im) && re + Math.abs(im) > 0)
    ? null
    : 'The second supply needs an impedance above zero.'
}

/** The first thing in the order of starts and disturbances that no run can be made of, or null. */
export function checkSchedule({ motors, disturbance, supply }: CaseInput): Refusal | null {
  for (const motor of motors) {
    const problem = motorProblem(motor, motors)
    if (problem !== null) return refuse('bad-value', [motor.busId], `Motor ${motor.id}: ${problem}`).outcome
  }
  if (disturbance === undefined) return null
  const { at, duration, remaining } = disturbance
  const second = secondSupplyProblem(disturbance, supply.generator !== undefined)
  if (second !== null) return refuse('bad-value', [supply.busId], second).outcome
  if (notNegative(at) && positive(duration) && notNegative(remaining)) return null
  return refuse(
    'bad-value',
    [supply.busId],
    'A disturbance begins at zero or later, lasts some time and leaves zero or more of the voltage.',
  ).outcome
}
