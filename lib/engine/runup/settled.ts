import type { Courses } from './course'
import { runningEquilibrium } from './equilibrium'
import { settleSupply } from './generator-course'
import { findBalance, turningMotors } from './hang'
import { createObserver, observationLength } from './observation'
import type { RunRecord } from './simulate'
import type { System } from './system'

/** States in which every torque balances, once the run is over; null where they were not reached or do not exist. */
export interface SettledStates {
  /** With the load curves of the start. */
  afterStart: Float64Array | null
  /** With the process on. */
  afterProcess: Float64Array | null
  /** Speeds at the end, rad/s: at the balance where there is one. */
  speeds: Float64Array
}

/** Farthest balance, in parts of synchronous speed, that the end of a run is taken to lead to. */
const near = 2e-2

/** Solves for the balances that a run leads to, by algebra instead of waiting for them. */
export function settledStates(system: System, courses: Courses, record: RunRecord): SettledStates {
  const speeds = Float64Array.from(record.state)
  if (record.end.kind === 'collapsed') return { afterStart: null, afterProcess: null, speeds }
  const observe = createObserver(system)
  const observation = (): Float64Array | null => {
    if (!system.solveAt(speeds)) return null
    const into = new Float64Array(observationLength(system))
    observe(speeds, into)
    return into
  }
  if (system.supply?.generator) return settledOnGenerator(system, courses, record, speeds, observation)
  const moving = turningMotors(system)
  const balance = findBalance(system, speeds, near)
  if (balance === null) return { afterStart: null, afterProcess: null, speeds }
  speeds.set(balance)
  const ended = Float64Array.from(speeds)
  const started = courses.starts.every((start) => start.outcome?.kind === 'started')
  if (!started) return { afterStart: null, afterProcess: null, speeds: ended }
  const afterStart = observation()
  const crawling = moving.some((i) => speeds[i]! < system.plant.breakdownSpeed[i]!)
  system.driven = system.plant.process
  const carried = !crawling && runningEquilibrium(system, moving, speeds).kind === 'found'
  const afterProcess = carried ? observation() : null
  system.driven = system.plant.driven
  return { afterStart, afterProcess, speeds: ended }
}

/** On a generator the balance is waited for: voltage and frequency move with it. */
function settledOnGenerator(
  system: System,
  courses: Courses,
  record: RunRecord,
  state: Float64Array,
  observation: () => Float64Array | null,
): SettledStates {
  const ended = Float64Array.from(state)
  const started = courses.starts.every((start) => start.outcome?.kind === 'started')
  if (!started || record.end.kind !== 'settled') return { afterStart: null, afterProcess: null, speeds: ended }
  const afterStart = observation()
  system.driven = system.plant.process
  const afterProcess = settleSupply(system, state, true) ? observation() : null
  system.driven = system.plant.driven
  return { afterStart, afterProcess, speeds: ended }
}
