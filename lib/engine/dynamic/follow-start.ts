import { loadTorqueAt } from '../driven/load-segments'
import type { System } from '../runup/system'
import type { HalfCycle } from '../transient/half-cycle'
import type { TransientMachine } from '../transient/machine-equations'
import { type HalfCycleRun, runHalfCycles } from '../transient/run-half-cycles'
import type { EnvelopeRecord } from './envelope-record'

/** Below this part of synchronous speed friction builds up, so that a shaft that cannot break away stays all but still. */
export const creep = 1e-3
/** Torque left over five periods, in parts of rated, at which a run is over, and how long it goes on at most past the criterion, s. */
export const settledTorque = 2e-3
const longestTail = 5
/** Half periods that torque is averaged over to see whether it accelerates. */
export const window = 10
/** Speed in parts of synchronous at which the load has run away with the machine. */
const farthest = 1.5
/** Waveforms kept, s. */
const kept = 0.3

/** Average torque left over the last five periods. */
function createTrend() {
  const last = new Float64Array(window)
  let count = 0
  return {
    add(value: number): void {
      last[count % window] = value
      count++
    },
    /** NaN before five periods have passed. */
    get average(): number {
      return count < window ? Number.NaN : last.reduce((sum, each) => sum + each, 0) / window
    },
  }
}

interface Least {
  torque: number
  speed: number
}

/** A start by the transient model, followed to its end. */
export interface FollowedStart {
  run: HalfCycleRun
  record: EnvelopeRecord
  least: Least | null
  /** Torque left at the end, averaged. */
  left: number
  /** ∫I²dt and rotor heat up to the criterion. */
  i2t: number
  slipEnergy: number
  highest: number
}

/** Torque of the load with friction that builds up over the first part in a thousand of synchronous speed. */
export function frictional(system: System, motor: number): (speed: number) => number {
  const load = system.driven[motor]!
  const slow = creep * system.plant.synchronous[motor]!
  if (load.active) return (speed) => loadTorqueAt(load, speed)
  return (speed) =>
    Math.abs(speed) >= slow
      ? loadTorqueAt(load, speed)
      : (loadTorqueAt(load, Math.sign(speed) * slow) * Math.abs(speed)) / slow
}

/** Runs the machine up and stops once the start has ended one way or the other. */
export function followStart(
  system: System,
  motor: number,
  machine: TransientMachine,
  load: (speed: number) => number,
  from: number,
  record: EnvelopeRecord,
  note: (half: HalfCycle) => void,
): FollowedStart {
  const { input } = system.plant
  const own = input.motors[motor]!
  const { ratedSpeed, torqueFactor, inertia, ratedTorque } = own
  const synchronous = system.plant.synchronous[motor]!
  const goals = [0.95 * ratedSpeed, input.settings.speedCriterion * ratedSpeed]
  const trend = createTrend()
  let least: Least | null = null
  let reachedAt: number | null = from >= goals[1]! ? 0 : null
  let highest = from
  let [i2t, slipEnergy] = [0, 0]
  const run = runHalfCycles(
    machine,
    {
      loadTorque: (speed) => load(speed) / torqueFactor,
      inertia: inertia / torqueFactor,
      from,
      speeds: goals,
      until: input.settings.timeLimit,
      kept,
    },
    (half) => {
      note(half)
      trend.add(torqueFactor * half.torque.mean - load(half.speed))
      highest = Math.max(highest, half.speed)
      const left = trend.average
      if (highest < goals[0]! && (least === null || left < least.torque) && !Number.isNaN(left))
        least = { torque: left, speed: half.speed }
      if (reachedAt === null && half.speed >= goals[1]!) reachedAt = half.to
      if (reachedAt === null || half.from < reachedAt) {
        i2t = record.i2t
        slipEnergy = record.slipEnergy
      }
      if (half.speed > farthest * synchronous) return false
      const calm = Math.abs(left) < settledTorque * ratedTorque
      if (reachedAt !== null) return !(calm && half.to > reachedAt + 0.2) && half.to < reachedAt + longestTail
      return !(calm && half.to > 1)
    },
  )
  return { run, record, least, left: trend.average, i2t, slipEnergy, highest }
}
