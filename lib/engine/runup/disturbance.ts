import { sameInstant } from './schedule'
import type { System } from './system'

/** The disturbance of a run on its way; one that does not exist has no instants. */
export interface DisturbanceCourse {
  /** Its next instant, s; null when there is none left. */
  nextAt(): number | null
  /** Its last instant, s; 0 without one. */
  readonly endsAt: number
  /** Begins or ends it when that is due; whether it did. */
  act(t: number): boolean
}

/** A dip or loss of the supply's EMF, which comes back as it was, or another supply in its place. */
export function createDisturbance(system: System, state: Float64Array): DisturbanceCourse {
  const { disturbance } = system.plant.input
  if (disturbance === undefined) return { nextAt: () => null, endsAt: 0, act: () => false }
  const { at, duration, remaining } = disturbance
  const instants = [at, at + duration]
  const parts = [remaining, 1]
  let passed = 0
  return {
    nextAt: () => instants[passed] ?? null,
    endsAt: at + duration,
    act(t) {
      const due = instants[passed]
      if (due === undefined || t < due - sameInstant) return false
      if (passed === 1 && disturbance.to) system.transfer(state)
      else system.setSource(parts[passed]!)
      passed++
      return true
    },
  }
}
