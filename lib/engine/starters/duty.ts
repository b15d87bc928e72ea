import { type Second, second } from '../../units/si'
import type { Starter } from '../case-input'
import type { StarterDuty } from '../starter-input'

/** What a start asks of its device, held against what the device may be asked for. */
export interface DutyResult {
  /** Time outside the running position, s; to the end of the run where that was not reached. */
  time: Second
  permittedTime: Second | null
  startsPerHour: number | null
  plannedPerHour: number | null
  /** Not assessed where neither the time nor the number of starts is known. */
  verdict: 'within' | 'exceeded' | 'not-assessed'
}

/** Devices that heat up while a start is on them. */
const heated = (starter: Starter): boolean => starter.kind !== 'direct' && starter.kind !== 'captive-transformer'

/**
 * Holds a start against the duty of its device: seconds on it, and starts planned an hour against starts allowed.
 * Exceeded where any known figure is; null for devices that nothing heats. Source: common practice, no standard.
 */
export function judgeDuty(starter: Starter, duty: StarterDuty | undefined, time: number): DutyResult | null {
  if (!heated(starter)) return null
  const permittedTime = duty?.secondsPerStart ?? null
  const startsPerHour = duty?.startsPerHour ?? null
  const plannedPerHour = duty?.plannedPerHour ?? null
  const tooLong = permittedTime !== null && time > permittedTime
  const tooOften = startsPerHour !== null && plannedPerHour !== null && plannedPerHour > startsPerHour
  const known = permittedTime !== null || (startsPerHour !== null && plannedPerHour !== null)
  const verdict = tooLong || tooOften ? 'exceeded' : known ? 'within' : 'not-assessed'
  return { time: second(time), permittedTime, startsPerHour, plannedPerHour, verdict }
}
