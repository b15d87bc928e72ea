import { radianPerSecond, second } from '../../units/si'
import type { StartOutcome } from '../case-result'
import type { StartCourse } from './course'
import { type Move, sameInstant } from './schedule'
import type { System } from './system'

type TripCause = Extract<StartOutcome, { kind: 'tripped' }>['cause']

/** Takes the motor of a start off the line for a cause; it coasts and the start is over. */
export function trip(system: System, start: StartCourse, cause: TripCause, speed: number, t: number): Move {
  start.position = 'off'
  system.move(start.motor, null, t)
  system.connection.shunt[start.motor] = 0
  for (const each of [start.watches.voltage, start.watches.accelerating]) each.active = false
  start.outcome = {
    kind: 'tripped',
    cause,
    at: second(t - start.at),
    speed: radianPerSecond(speed),
  }
  return { start, capacitor: null, off: true }
}

/** When the protection takes the last attempt of a start off the line; null where it does not, and once it has. */
export function protectionDue(start: StartCourse): number | null {
  const last = start.attempt === start.attempts.length
  return start.tripAt === null || !last || !start.switchedOn || start.position === 'off'
    ? null
    : start.at + start.tripAt
}

/** Ends the starts whose protection operates at t. */
export function tripProtected(system: System, starts: readonly StartCourse[], state: Float64Array, t: number): Move[] {
  return starts.flatMap((start): Move[] => {
    const due = protectionDue(start)
    return due === null || t < due - sameInstant ? [] : [trip(system, start, 'protection', state[start.motor]!, t)]
  })
}
