import { newtonMetre, radianPerSecond } from '../../units/si'
import type { StartOutcome } from '../case-result'
import { excessOf } from './condition'
import { type StartCourse, untilOf } from './course'
import { balanceNear, isStable } from './equilibrium'
import type { System } from './system'

/** How far from its balance, in parts of synchronous speed, a shaft counts as on its last stretch. */
const lastStretch = 5e-3

/**
 * The stable balance of torques that the turning shafts are close to; null when there is none within `near`, in parts
 * of synchronous speed. Speeds of shafts at rest, and what else the state holds, stay as they are.
 */
export function findBalance(system: System, state: Float64Array, near: number): Float64Array | null {
  const speeds = Float64Array.from(state)
  const moving = turningMotors(system)
  if (moving.length === 0) return speeds
  if (!balanceNear(system, moving, speeds)) return null
  const close = moving.every((i) => Math.abs(speeds[i]! - state[i]!) <= near * system.plant.synchronous[i]!)
  return close && isStable(system, moving, speeds) && system.solveAt(speeds) ? speeds : null
}

/**
 * Looks whether the starts that are still open have come to where they stay: every shaft at or close to a stable
 * balance of torques short of what the start waits for.
 *
 * @returns speeds at that balance, or null when a start is still on its way
 */
export function findHang(system: System, open: readonly StartCourse[], state: Float64Array): Float64Array | null {
  const speeds = findBalance(system, state, lastStretch)
  if (speeds === null) return null
  for (const start of open) {
    if (system.resting[start.motor]) continue
    const until = untilOf(start)
    if (until === null && speeds[start.motor]! >= start.speedCriterion) return null
    if (until !== null && excessOf(until, system, start.motor, speeds[start.motor]!) >= 0) return null
  }
  return speeds
}

/** Shafts that turn with a connected motor, each by its first motor. */
export const turningMotors = (system: System): number[] =>
  system.plant.mates.flatMap((mates, i) =>
    mates[0] === i && mates.some((m) => system.connection.code[m] !== 0) && !system.resting[i] ? [i] : [],
  )

/** The outcome of a start that hangs at the given speeds. */
export function hangOutcome(system: System, start: StartCourse, speeds: Float64Array): StartOutcome {
  const i = start.motor
  const speed = radianPerSecond(speeds[i]!)
  if (system.resting[i]) {
    system.solveAt(speeds)
    const missing = newtonMetre(-system.balance(i, 0))
    return start.turned ? { kind: 'stalled', speed: radianPerSecond(0), missing } : { kind: 'never-turned', missing }
  }
  if (untilOf(start) !== null) return { kind: 'not-transferred', speed }
  if (speed >= system.plant.breakdownSpeed[i]!) return { kind: 'below-criterion', speed }
  return { kind: 'stalled', speed, missing: newtonMetre(largestLack(system, i, speeds)) }
}

/** Largest excess of load torque over motor torque between the hang and breakdown speed, the others at their speeds. */
function largestLack(system: System, i: number, speeds: Float64Array): number {
  const trial = Float64Array.from(speeds)
  const [from, to] = [speeds[i]!, system.plant.breakdownSpeed[i]!]
  const points = 200
  let largest = 0
  for (let p = 1; p <= points; p++) {
    trial[i] = from + ((to - from) * p) / points
    if (!system.solveAt(trial)) continue
    largest = Math.max(largest, -system.balance(i, trial[i]!))
  }
  return largest
}
