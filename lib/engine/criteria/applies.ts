import type { CaseInput, MotorInput } from '../case-input'
import type { RuleInput, StartClass, StartFrequency } from './rule'

/** Whether a class of starts is the one in use: every bound that it states holds for the declared frequency. */
export function classInUse(startClass: StartClass | null, starts: StartFrequency): boolean {
  if (startClass === null) return true
  const { moreThanPerDay, atMostPerDay, moreThanPerHour, atMostPerHour } = startClass
  return (
    (moreThanPerDay === null || starts.perDay > moreThanPerDay) &&
    (atMostPerDay === null || starts.perDay <= atMostPerDay) &&
    (moreThanPerHour === null || starts.perHour > moreThanPerHour) &&
    (atMostPerHour === null || starts.perHour <= atMostPerHour)
  )
}

/** Motors started in the case that the rule's methods and, at a place of its own, its motors leave in. */
export function startsUnder(rule: RuleInput, input: CaseInput): MotorInput[] {
  const { methods, motorIds } = rule.appliesTo
  return input.motors.filter(
    ({ id, duty }) =>
      duty.kind === 'starting' &&
      (methods === null || methods.includes(duty.starter.kind)) &&
      (motorIds === null || rule.place.kind === 'running-motors' || motorIds.includes(id)),
  )
}

/** Running motors of the case that the rule's motors leave in. */
export function runningUnder(rule: RuleInput, input: CaseInput): MotorInput[] {
  const { motorIds } = rule.appliesTo
  return input.motors.filter(({ id, duty }) => duty.kind === 'running' && (motorIds === null || motorIds.includes(id)))
}

/**
 * Whether a rule holds for a case: its list of cases, a start by one of its methods, a motor at its place. A rule on
 * methods or motors says nothing about a case in which nothing like that happens.
 */
export function appliesTo(rule: RuleInput, input: CaseInput): boolean {
  const { caseIds, methods, motorIds } = rule.appliesTo
  if (caseIds !== null && !caseIds.includes(input.id)) return false
  const starts = startsUnder(rule, input)
  if (rule.place.kind === 'starting-motors') return starts.length > 0
  if (rule.place.kind === 'running-motors') {
    return runningUnder(rule, input).length > 0 && (methods === null || starts.length > 0)
  }
  return (methods === null && motorIds === null) || starts.length > 0
}
