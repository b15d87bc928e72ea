import { loadTorqueAt } from '../driven/load-segments'
import { evaluateMachine } from '../machines/machine-table'
import { solveReal } from '../numeric/real-lu'
import { findRoot } from '../numeric/root'
import { codes, evaluateConnection } from '../starters/connection'
import type { System } from './system'

/** How the search for speeds at which every torque balances ended. */
export type EquilibriumOutcome =
  | { kind: 'found' }
  | { kind: 'no-network' }
  /** The load of this motor exceeds its breakdown torque at the voltage it would have. */
  | { kind: 'no-equilibrium'; motor: number }

const maxRounds = 200

/**
 * Speeds near synchronous at which the given motors, directly connected, carry their loads together; `speeds` is
 * overwritten for them and kept for the others.
 *
 * From synchronous speed on, each motor goes to the slip that its load asks for at the voltage of the round before.
 * Slips only grow and voltages only fall on the way, so the first balance met is the one a plant runs at, and a motor
 * without a slip left has none. Newton's method then finishes.
 */
export function runningEquilibrium(
  system: System,
  moving: readonly number[],
  speeds: Float64Array,
): EquilibriumOutcome {
  const { synchronous } = system.plant
  // A drive sets the speed of its motor by itself.
  const isFirst = (i: number): boolean => system.plant.mates[i]!.find((m) => moving.includes(m)) === i
  const shafts = moving.filter(isFirst)
  const free = shafts.filter((i) => system.connection.code[i] !== codes.drive)
  for (const i of free) setSpeed(system, speeds, i, synchronous[i]!)
  let lacking = -1
  let lackingFor = 0
  for (let round = 0; round < maxRounds; round++) {
    if (!system.solveAt(speeds)) return { kind: 'no-network' }
    let change = 0
    let without = -1
    for (const i of free) {
      const slip = runningSlip(system, i)
      if (slip === null) without = i
      const speed = slip === null ? system.plant.breakdownSpeed[i]! : synchronous[i]! * (1 - slip)
      change = Math.max(change, Math.abs(speed - speeds[i]!) / synchronous[i]!)
      setSpeed(system, speeds, i, speed)
    }
    lackingFor = without >= 0 && without === lacking ? lackingFor + 1 : 0
    lacking = without
    if (lackingFor >= 3) return { kind: 'no-equilibrium', motor: lacking }
    if (without < 0 && change < 1e-4) {
      const kept = Float64Array.from(speeds)
      if (balanceNear(system, shafts, speeds)) return { kind: 'found' }
      speeds.set(kept)
      if (change < 1e-12) return { kind: 'found' }
    }
  }
  return lacking >= 0 ? { kind: 'no-equilibrium', motor: lacking } : { kind: 'found' }
}

/** Sets the speed of a shaft in the entries of all its motors. */
function setSpeed(system: System, speeds: Float64Array, i: number, speed: number): void {
  for (const m of system.plant.mates[i]!) speeds[m] = speed
}

/** Slip between 0 and breakdown at which a motor carries its load at its present bus voltage; null where its torque does not suffice. */
function runningSlip(system: System, i: number): number | null {
  const { machines, synchronous, torqueFactor, breakdownSpeed, mates } = system.plant
  const surplus = (slip: number): number => {
    const speed = synchronous[i]! * (1 - slip)
    let left = 0
    for (const m of mates[i]!) {
      left -= loadTorqueAt(system.driven[m]!, speed)
      if (system.connection.code[m] === 0) continue
      evaluateMachine(machines, m, 1 - speed / synchronous[m]!)
      evaluateConnection(system.connection, machines, m, system.busSquare[m]!)
      const perPower = (torqueFactor[m]! * system.busSquare[m]!) / synchronous[m]!
      left += perPower * machines.airgap[m]! * system.connection.winding[m]!
    }
    return left
  }
  const largest = 1 - breakdownSpeed[i]! / synchronous[i]!
  const [idle, most] = [surplus(0), surplus(largest)]
  if (idle >= 0) return 0
  if (most < 0) return null
  return findRoot(surplus, 0, largest, 1e-14, idle, most)
}

/**
 * Speeds at which the torques of the given motors balance, by Newton's method from the present ones, network included;
 * `speeds` is overwritten. False where it does not converge (the speeds are then of no use).
 */
export function balanceNear(system: System, moving: readonly number[], speeds: Float64Array): boolean {
  const m = moving.length
  const { synchronous, ratedTorque } = system.plant
  const jacobian = new Float64Array(m * m)
  const excess = new Float64Array(m)
  const step = new Float64Array(m)
  const imbalance = (into: Float64Array): boolean => {
    if (!system.solveAt(speeds)) return false
    moving.forEach((i, row) => {
      into[row] = system.balance(i, speeds[i]!) / ratedTorque[i]!
    })
    return true
  }
  let last = Number.POSITIVE_INFINITY
  for (let round = 0; round < 20; round++) {
    if (!imbalance(excess)) return false
    for (let column = 0; column < m; column++) {
      const i = moving[column]!
      const kept = speeds[i]!
      const nudge = 1e-7 * synchronous[i]!
      setSpeed(system, speeds, i, kept - nudge)
      if (!imbalance(step)) return false
      setSpeed(system, speeds, i, kept)
      for (let row = 0; row < m; row++) jacobian[row * m + column] = (excess[row]! - step[row]!) / 1e-7
    }
    for (let row = 0; row < m; row++) step[row] = -excess[row]!
    if (!solveReal(jacobian, step, m)) return false
    let change = 0
    moving.forEach((i, row) => {
      // A step past a tenth of synchronous speed leaves the neighbourhood the method is good for.
      const limited = Math.max(-0.1, Math.min(0.1, step[row]!))
      setSpeed(system, speeds, i, speeds[i]! + limited * synchronous[i]!)
      change = Math.max(change, Math.abs(limited))
    })
    if (!Number.isFinite(change)) return false
    if (change < 1e-13 || (change < 1e-10 && change >= last)) return system.solveAt(speeds)
    last = change
  }
  return false
}

/** True when every given motor, at its balance, returns there after a small change of its own speed. */
export function isStable(system: System, moving: readonly number[], speeds: Float64Array): boolean {
  for (const i of moving) {
    const kept = speeds[i]!
    const nudge = 1e-5 * system.plant.synchronous[i]!
    setSpeed(system, speeds, i, kept - nudge)
    const below = system.solveAt(speeds) ? system.balance(i, speeds[i]!) : -1
    setSpeed(system, speeds, i, kept + nudge)
    const above = system.solveAt(speeds) ? system.balance(i, speeds[i]!) : 1
    setSpeed(system, speeds, i, kept)
    if (!(below > above)) return false
  }
  return true
}
