import { rampOf } from '../starters/position'
import { type StartCourse, untilOf } from './course'
import type { System } from './system'

/** Two instants closer than this are one. */
export const sameInstant = 1e-12

/** What moved at an instant: the device of a start, or one of its capacitors. */
export interface Move {
  start: StartCourse
  capacitor: number | null
  /** The motor was taken off the line. */
  off?: true
}

/** Brings a starting device into its next position, and the watches of its motor with it. */
export function advance(system: System, start: StartCourse, t: number): Move {
  start.step++
  const step = start.steps[start.step]!
  start.position = step.position
  start.since = t
  system.move(start.motor, step, t)
  if (step.until === null) start.runningAt = t
  const connected = step.position !== 'open'
  start.watches.line.active = true
  start.watches.motor.active = true
  start.watches.voltage.active = connected
  start.watches.accelerating.active = connected && start.at95 === null
  setCapacitors(system, start)
  return { start, capacitor: null }
}

/** Switches a capacitor of a start in or out. */
export function switchCapacitor(system: System, start: StartCourse, capacitor: number): Move {
  const one = start.capacitors[capacitor]!
  one.state = one.state === 'waiting' ? 'in' : 'out'
  setCapacitors(system, start)
  return { start, capacitor }
}

/** Susceptance of the capacitors that are in; none while the motor is off the line. */
function setCapacitors(system: System, start: StartCourse): void {
  const off = start.position === 'open' || start.position === 'off'
  system.connection.shunt[start.motor] = off
    ? 0
    : start.capacitors.reduce((sum, { item, state }) => (state === 'in' ? sum + item.susceptance : sum), 0)
}

/** When the present position of a start is left by time; null when it waits for something else or is kept. */
function dueAt(start: StartCourse): number | null {
  if (!start.switchedOn) {
    if (start.former === null) return start.at
    return start.former.outcome?.kind === 'started' ? Math.max(start.at, start.former.at + start.interval) : null
  }
  const until = untilOf(start)
  if (until?.kind === 'after') return start.since + until.time
  return until?.kind === 'time' ? Math.max(start.since, start.at + until.at) : null
}

/** When a capacitor of a start is switched by time; null when it is not. */
function capacitorDue(start: StartCourse, capacitor: number): number | null {
  const { item, state } = start.capacitors[capacitor]!
  if (!start.switchedOn || state === 'out') return null
  if (state === 'waiting' && item.on === null) return start.at
  const until = state === 'waiting' ? item.on : item.off
  return until?.kind === 'time' ? start.at + until.at : null
}

/** Whether a start still has a capacitor to switch by time. */
export const awaitsCapacitor = (start: StartCourse, t: number): boolean =>
  start.capacitors.some((_, c) => (capacitorDue(start, c) ?? t) > t + sameInstant)

/** Does the switchings that are due at t; returns what moved. */
export function switchDue(system: System, starts: readonly StartCourse[], t: number): Move[] {
  const moves: Move[] = []
  const isDue = (due: number | null): boolean => due !== null && t >= due - sameInstant
  for (const start of starts) {
    const fresh = !start.switchedOn
    if (isDue(dueAt(start))) {
      if (fresh) start.at = t
      start.switchedOn = true
      moves.push(advance(system, start, t))
    }
    start.capacitors.forEach((_, c) => {
      if (!isDue(capacitorDue(start, c))) return
      const move = switchCapacitor(system, start, c)
      if (!fresh) moves.push(move)
    })
  }
  return moves
}

/** When the ramp of the present position is over, s; before the start of time where it has none. */
export const rampEnd = (start: StartCourse): number => {
  const step = start.steps[start.step]
  return step === undefined || rampOf(step) === 0 ? Number.NEGATIVE_INFINITY : start.since + rampOf(step)
}

/** Whether a start waits for one that has ended without starting, or that waits so itself. */
export const isForlorn = ({ former, switchedOn }: StartCourse): boolean =>
  !switchedOn &&
  former !== null &&
  (isForlorn(former) || (former.outcome !== null && former.outcome.kind !== 'started'))

/** Earliest switching, end of a ramp, of an attempt or time limit after t, one of the others given, or the horizon. */
export function nextInstant(
  starts: readonly StartCourse[],
  others: readonly (number | null)[],
  t: number,
  timeLimit: number,
  horizon: number,
): number {
  let next = horizon
  const consider = (instant: number | null): void => {
    if (instant !== null && instant > t + sameInstant && instant < next) next = instant
  }
  for (const start of starts) {
    consider(dueAt(start))
    for (let c = 0; c < start.capacitors.length; c++) consider(capacitorDue(start, c))
    consider(rampEnd(start))
    if (start.outcome === null && start.switchedOn) consider(start.at + timeLimit)
  }
  for (const other of others) consider(other)
  return next
}

/** An instant after which nothing can be pending: every start after the other, every attempt, the disturbance. */
export function latestEnd(starts: readonly StartCourse[], disturbed: number, timeLimit: number): number {
  let end = disturbed
  for (const { at, interval, former, attempts } of starts) {
    end = Math.max(end, at)
    if (former !== null) end += interval + timeLimit
    for (const { runFor, rest } of attempts) end += runFor + rest
  }
  return end + 2 * timeLimit
}
