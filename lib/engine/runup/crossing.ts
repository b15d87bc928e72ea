import { generatorState } from '../machines/generator'
import type { Integrator } from '../numeric/dormand-prince'
import { findRoot } from '../numeric/root'
import { codes } from '../starters/connection'
import type { Until } from '../starters/position'
import { excessOf, isElectrical } from './condition'
import { contactorExcess } from './contactor'
import { type Courses, type StartCourse, untilOf } from './course'
import { rampEnd } from './schedule'
import type { System } from './system'

/** What a speed does on its way that the run-up must know of. */
export type CrossingKind =
  | 'corner-up'
  | 'corner-down'
  | 'halt'
  /** A passive load that turned backwards comes to zero speed. */
  | 'stand'
  | 'at-95'
  | 'criterion'
  | 'change-over'
  | 'capacitor'
  | 'undervoltage'
  /** The voltage that the contactor of a running motor waits for. */
  | 'contactor'
  | 'pull-out'
  | 'recovery'

export interface Crossing {
  motor: number
  kind: CrossingKind
  /** Speed crossed, rad/s; null where it is not a speed. */
  speed: number | null
  /** What a condition on current or voltage is exceeded by. */
  excess: ((state: Float64Array) => number) | null
  /** Which capacitor of the start. */
  capacitor: number
  at: number
}

/** Instants are located to a tenth of a nanosecond; the speeds they rest on are good to the integration tolerance. */
const sharpness = 1e-10
/** Parts into which a step is cut to see where it turned round. */
const looks = 16

/** Crossings in the last step that come first; more than one only where they coincide. */
export function firstCrossings(system: System, courses: Courses, integrator: Integrator): Crossing[] {
  const found = candidates(system, courses, integrator)
  if (found.length === 0) return []
  const scratch = new Float64Array(system.stateLength)
  for (const each of found) each.at = locate(system, integrator, each, scratch)
  const first = Math.min(...found.map((each) => each.at))
  return found.filter((each) => each.at <= first + 10 * sharpness)
}

/** Crossings that the state at the end of a step shows to have happened. */
function candidates(system: System, courses: Courses, { state, time }: Integrator): Crossing[] {
  const found: Crossing[] = []
  const note = (motor: number, kind: CrossingKind, speed: number): void => {
    found.push({ motor, kind, speed, excess: null, capacitor: -1, at: 0 })
  }
  for (let i = 0; i < system.plant.motors.length; i++) {
    if (system.resting[i]) continue
    const { corners } = system.driven[i]!
    const piece = system.piece[i]!
    const speed = state[i]!
    if (speed < 0 && piece >= 0 && !system.driven[i]!.active) note(i, 'halt', 0)
    if (speed > 0 && piece < 0) note(i, 'stand', 0)
    if (piece < corners.length && speed > corners[piece]!) note(i, 'corner-up', corners[piece]!)
    if (piece > 0 && speed < corners[piece - 1]!) note(i, 'corner-down', corners[piece - 1]!)
  }
  for (const start of courses.starts) {
    if (system.resting[start.motor] || !start.switchedOn) continue
    const speed = state[start.motor]!
    if (start.at95 === null && speed >= start.speed95) note(start.motor, 'at-95', start.speed95)
    if (start.atCriterion === null && speed >= start.speedCriterion)
      note(start.motor, 'criterion', start.speedCriterion)
  }
  for (const start of courses.starts) found.push(...conditionsMet(system, start, state, time))
  found.push(...contactorsMoved(system, courses, state, time))
  for (const { motor, pulledOutAt } of courses.running) {
    if (system.resting[motor]) continue
    const rated = system.plant.breakdownSpeed[motor]!
    const { supply } = system
    const frequencyIn = (at: Float64Array): number => (supply?.generator ? at[supply.at + generatorState.speed]! : 1)
    const limit = rated * frequencyIn(state)
    const kind = pulledOutAt === null ? 'pull-out' : 'recovery'
    const sign = pulledOutAt === null ? 1 : -1
    if (!(sign * (limit - state[motor]!) > 0)) continue
    if (!supply?.generator) note(motor, kind, limit)
    else {
      const excess = (at: Float64Array): number => sign * (rated * frequencyIn(at) - at[motor]!)
      found.push({ motor, kind, speed: null, excess, capacitor: -1, at: 0 })
    }
  }
  return found
}

/** Conditions of a starting device and its capacitors that the end of a step meets. */
function conditionsMet(system: System, start: StartCourse, state: Float64Array, t: number): Crossing[] {
  if (!start.switchedOn || start.outcome?.kind === 'tripped') return []
  const { motor } = start
  const found: Crossing[] = []
  const look = (kind: CrossingKind, until: Until | null, capacitor: number): void => {
    if (until === null || (until.kind === 'current' && t < rampEnd(start))) return
    if (isElectrical(until)) {
      const excess = (at: Float64Array): number => {
        const solved = system.solveAt(at)
        return solved ? excessOf(until, system, motor, at[motor]!) : Number.NEGATIVE_INFINITY
      }
      system.setTime(t)
      if (excess(state) >= 0) found.push({ motor, kind, speed: null, excess, capacitor, at: 0 })
      return
    }
    if (until.kind === 'speed' && !system.resting[motor] && state[motor]! >= until.at) {
      found.push({ motor, kind, speed: until.at, excess: null, capacitor, at: 0 })
    }
  }
  look('change-over', untilOf(start), -1)
  start.capacitors.forEach(({ item, state: is }, c) => {
    if (is !== 'out') look('capacitor', is === 'waiting' ? item.on : item.off, c)
  })
  if (start.undervoltage !== null && system.connection.code[motor] === codes.drive) {
    const level = start.undervoltage
    const excess = (at: Float64Array): number =>
      system.solveAt(at) ? level - Math.sqrt(system.busSquare[motor]!) : Number.NEGATIVE_INFINITY
    system.setTime(t)
    if (excess(state) > 0) found.push({ motor, kind: 'undervoltage', speed: null, excess, capacitor: -1, at: 0 })
  }
  return found
}

/** Contactors whose voltage the end of a step meets. */
function contactorsMoved(system: System, courses: Courses, state: Float64Array, t: number): Crossing[] {
  const watched = [
    ...courses.running.filter(({ contactor }) => contactor !== null),
    ...courses.starts.filter(({ contactor, motor }) => contactor !== null && system.connection.code[motor] !== 0),
  ]
  if (watched.length === 0) return []
  const excessOfCourse =
    ({ motor, contactor }: (typeof watched)[number]) =>
    (at: Float64Array): number =>
      system.solveAt(at) ? contactorExcess(contactor!, Math.sqrt(system.busSquare[motor]!)) : Number.NEGATIVE_INFINITY
  system.setTime(t)
  if (!system.solveAt(state)) return []
  return watched
    .filter(({ motor, contactor }) => contactorExcess(contactor!, Math.sqrt(system.busSquare[motor]!)) > 0)
    .map((course) => ({
      motor: course.motor,
      kind: 'contactor' as const,
      speed: null,
      excess: excessOfCourse(course),
      capacitor: -1,
      at: 0,
    }))
}

function locate(system: System, integrator: Integrator, crossing: Crossing, scratch: Float64Array): number {
  const { motor, speed, excess: measured } = crossing
  const measure = (state: Float64Array): number =>
    speed !== null ? state[motor]! - speed : (measured?.(state) ?? Number.NEGATIVE_INFINITY)
  const excess = (t: number): number => {
    integrator.interpolate(t, scratch)
    if (measured) system.setTime(t)
    return measure(scratch)
  }
  const { from, time } = integrator
  if (measured) system.setTime(time)
  const after = measure(integrator.state)
  const before = excess(from)
  // A condition that is met already when its position is taken is acted on at once.
  if (measured && before >= 0) return Math.min(time, from + sharpness)
  if (before > 0 !== after > 0 && before !== 0) return findRoot(excess, from, time, sharpness, before, after)
  // A step that begins on the crossed speed itself has turned round within: a shaft let go that comes back to rest.
  for (let part = 1; part < looks; part++) {
    const t = from + (part / looks) * (time - from)
    const there = excess(t)
    if (there > 0 !== after > 0 && there !== 0) return findRoot(excess, t, time, sharpness, there, after)
  }
  return before === 0 ? Math.min(time, from + sharpness) : time
}
