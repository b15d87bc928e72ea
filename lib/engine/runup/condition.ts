import type { Until } from '../starters/position'
import type { System } from './system'

/** How close to the whole voltage, in parts of its square, a soft starter counts as conducting fully. */
const whole = 1e-9

/**
 * By how much a condition on speed, current or voltage is exceeded (0 or more: met), after `solveAt`, in its own unit;
 * minus infinity for a condition on time.
 */
export function excessOf(until: Until, system: System, motor: number, speed: number): number {
  switch (until.kind) {
    case 'speed':
      return speed - until.at
    case 'current':
      return until.below - Math.sqrt(system.lineSquare[motor]!)
    case 'voltage':
      return Math.sqrt(system.busSquare[motor]!) * system.connection.terminal[motor]! - until.above
    case 'full-voltage':
      return system.connection.winding[motor]! - 1 + whole
    default:
      return Number.NEGATIVE_INFINITY
  }
}

/** Whether a condition can only be told with the network solved. */
export const isElectrical = (until: Until | null): boolean =>
  until !== null && (until.kind === 'current' || until.kind === 'voltage' || until.kind === 'full-voltage')
