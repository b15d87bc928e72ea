import { radianPerSecond, second } from '../../units/si'
import type { StartCourse } from './course'
import type { Move } from './schedule'
import type { System } from './system'

/** Takes the motor of a start off the line because its drive or contactor lacks voltage; it coasts and the start is over. */
export function trip(
  system: System,
  start: StartCourse,
  cause: 'undervoltage' | 'contactor',
  speed: number,
  t: number,
): Move {
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
