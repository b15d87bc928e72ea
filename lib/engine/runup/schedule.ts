import { changeOverOf, firstPosition, gapOf, type Position } from '../starters/position'
import type { StartCourse } from './course'
import type { System } from './system'

/** Two instants closer than this are one. */
export const sameInstant = 1e-12

const onFirstPosition = (start: StartCourse): boolean => start.position === 'tap' || start.position === 'star'

/** Brings a starting device into a position, and the watches of its motor with it. */
export function moveTo(system: System, start: StartCourse, position: Position, t: number): void {
  start.position = position
  system.move(start.motor, position)
  if (position === 'running') start.runningAt = t
  if (position === 'open') start.openedAt = t
  const connected = position !== 'open'
  start.watches.line.active = true
  start.watches.motor.active = true
  start.watches.voltage.active = connected
  start.watches.accelerating.active = connected && start.at95 === null
}

/** Leaves the first position: over the gap where there is one. */
export const changeOver = (system: System, start: StartCourse, t: number): void =>
  moveTo(system, start, gapOf(start.starter) > 0 ? 'open' : 'running', t)

/** When a start's next switching by time is due; null when it waits for a speed or has nothing to come. */
export function dueAt(start: StartCourse): number | null {
  if (!start.switchedOn) return start.at
  if (start.position === 'open') return start.openedAt! + gapOf(start.starter)
  const change = changeOverOf(start.starter)
  return onFirstPosition(start) && change?.kind === 'time' ? start.at + change.at : null
}

/** Does the switchings that are due at t; returns the starts that moved. */
export function switchDue(system: System, starts: readonly StartCourse[], t: number): StartCourse[] {
  return starts.filter((start) => {
    const due = dueAt(start)
    if (due === null || t < due - sameInstant) return false
    if (start.position === 'open') moveTo(system, start, 'running', t)
    else if (start.switchedOn) changeOver(system, start, t)
    else {
      start.switchedOn = true
      moveTo(system, start, firstPosition(start.starter), t)
    }
    return true
  })
}

/** Earliest switching or time limit after t, or the horizon. */
export function nextInstant(starts: readonly StartCourse[], t: number, timeLimit: number, horizon: number): number {
  let next = horizon
  for (const start of starts) {
    const due = dueAt(start)
    if (due !== null && due > t + sameInstant && due < next) next = due
    const limit = start.at + timeLimit
    if (start.outcome === null && limit > t + sameInstant && limit < next) next = limit
  }
  return next
}
