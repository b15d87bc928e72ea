import { radianPerSecond, second } from '../../units/si'
import type { Courses, StartCourse } from './course'
import type { Watch } from './extremes'
import { type Move, sameInstant } from './schedule'
import type { System } from './system'

/** When the present attempt of a start is switched off; null for the last one and before it is on. */
export function attemptEnd(start: StartCourse): number | null {
  const attempt = start.attempts[start.attempt]
  return attempt === undefined || !start.switchedOn ? null : start.at + attempt.runFor
}

const forget = (each: Watch): void => {
  each.active = false
  each.value = Number.NaN
  each.at = Number.NaN
}

/** Switches off the attempts that are over: each is kept as it ended, and its motor coasts towards the next. */
export function endAttempts(system: System, courses: Courses, state: Float64Array, t: number): Move[] {
  return courses.starts.flatMap((start): Move[] => {
    const end = attemptEnd(start)
    if (end === null || t < end - sameInstant) return []
    const at = system.integral[start.motor]!
    const { watches } = start
    courses.earlier.push({
      ...start,
      i2t: start.i2t ?? state[at]!,
      slipEnergy: start.slipEnergy ?? state[at + 1]!,
      extraAtCriterion: start.extraAtCriterion ?? start.extraHeat,
      outcome: start.outcome ?? {
        kind: 'abandoned',
        at: second(t - start.at),
        speed: radianPerSecond(state[start.motor]!),
      },
      watches: {
        line: { ...watches.line },
        motor: { ...watches.motor },
        voltage: { ...watches.voltage },
        accelerating: { ...watches.accelerating },
      },
    })
    restart(system, start, state, t)
    return [{ start, capacitor: null, off: true }]
  })
}

/** Makes a start ready for its next attempt. */
function restart(system: System, start: StartCourse, state: Float64Array, t: number): void {
  const at = system.integral[start.motor]!
  system.move(start.motor, null, t)
  system.connection.shunt[start.motor] = 0
  state[at] = 0
  state[at + 1] = 0
  for (const each of Object.values<Watch>(start.watches)) forget(each)
  for (const capacitor of start.capacitors) capacitor.state = 'waiting'
  start.at = t + start.attempts[start.attempt]!.rest
  start.attempt++
  start.step = -1
  start.position = 'off'
  start.switchedOn = false
  start.turned = false
  start.runningAt = null
  start.at95 = null
  start.atCriterion = null
  start.i2t = null
  start.slipEnergy = null
  start.extraHeat = 0
  start.i2tSeen = 0
  start.extraAtCriterion = null
  start.standstill = null
  start.outcome = null
  if (start.contactor !== null) start.contactor.state = 'in'
}
