import type { Integrator } from '../numeric/dormand-prince'
import { findRoot } from '../numeric/root'
import type { Courses } from './course'
import type { System } from './system'

/** What a speed does on its way that the run-up must know of. */
export type CrossingKind =
  | 'corner-up'
  | 'corner-down'
  | 'halt'
  | 'at-95'
  | 'criterion'
  | 'change-over'
  | 'pull-out'
  | 'recovery'

export interface Crossing {
  motor: number
  kind: CrossingKind
  /** Speed crossed, rad/s. */
  speed: number
  at: number
}

/** Instants are located to a tenth of a nanosecond; the speeds they rest on are good to the integration tolerance. */
const sharpness = 1e-10
/** Parts into which a step is cut to see where it turned round. */
const looks = 16

/** Crossings in the last step that come first; more than one only where they coincide. */
export function firstCrossings(system: System, courses: Courses, integrator: Integrator): Crossing[] {
  const found = candidates(system, courses, integrator.state)
  if (found.length === 0) return []
  const scratch = new Float64Array(system.stateLength)
  for (const each of found) each.at = locate(integrator, each, scratch)
  const first = Math.min(...found.map((each) => each.at))
  return found.filter((each) => each.at <= first + 10 * sharpness)
}

/** Crossings that the state at the end of a step shows to have happened. */
function candidates(system: System, courses: Courses, state: Float64Array): Crossing[] {
  const found: Crossing[] = []
  const note = (motor: number, kind: CrossingKind, speed: number): void => {
    found.push({ motor, kind, speed, at: 0 })
  }
  for (let i = 0; i < system.plant.motors.length; i++) {
    if (system.resting[i]) continue
    const { corners } = system.driven[i]!
    const piece = system.piece[i]!
    const speed = state[i]!
    if (speed < 0) note(i, 'halt', 0)
    if (piece < corners.length && speed > corners[piece]!) note(i, 'corner-up', corners[piece]!)
    if (piece > 0 && speed < corners[piece - 1]!) note(i, 'corner-down', corners[piece - 1]!)
  }
  for (const start of courses.starts) {
    if (system.resting[start.motor]) continue
    const speed = state[start.motor]!
    if (start.at95 === null && speed >= start.speed95) note(start.motor, 'at-95', start.speed95)
    if (start.atCriterion === null && speed >= start.speedCriterion)
      note(start.motor, 'criterion', start.speedCriterion)
    const onFirst = start.position === 'tap' || start.position === 'star'
    if (onFirst && start.speedChangeOver !== null && speed >= start.speedChangeOver) {
      note(start.motor, 'change-over', start.speedChangeOver)
    }
  }
  for (const { motor, pulledOutAt } of courses.running) {
    if (system.resting[motor]) continue
    const limit = system.plant.breakdownSpeed[motor]!
    if (pulledOutAt === null && state[motor]! < limit) note(motor, 'pull-out', limit)
    if (pulledOutAt !== null && state[motor]! > limit) note(motor, 'recovery', limit)
  }
  return found
}

function locate(integrator: Integrator, crossing: Crossing, scratch: Float64Array): number {
  const excess = (t: number): number => {
    integrator.interpolate(t, scratch)
    return scratch[crossing.motor]! - crossing.speed
  }
  const { from, time } = integrator
  const after = integrator.state[crossing.motor]! - crossing.speed
  const before = excess(from)
  if (before > 0 !== after > 0 && before !== 0) return findRoot(excess, from, time, sharpness, before, after)
  // A step that begins on the crossed speed itself has turned round within: a shaft let go that comes back to rest.
  for (let part = 1; part < looks; part++) {
    const t = from + (part / looks) * (time - from)
    const there = excess(t)
    if (there > 0 !== after > 0 && there !== 0) return findRoot(excess, t, time, sharpness, there, after)
  }
  return before === 0 ? Math.min(time, from + sharpness) : time
}
