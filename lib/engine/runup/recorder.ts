import type { Integrator } from '../numeric/dormand-prince'
import type { Courses } from './course'
import { createExtremeSearch, type Watch } from './extremes'
import { createObserver, generatorPlace, generators, observationLength, placeOf } from './observation'
import { addSample, type SampleStore, sampleStore } from './sampler'
import type { System } from './system'

/** Watches a run: samples for the plots, extremes for the results. */
export interface Recorder {
  readonly samples: SampleStore
  /** The last instant observed. */
  readonly now: Float64Array
  /** Largest current-balance mismatch seen, in parts of the largest current. */
  readonly largestMismatch: number
  /** Solves and notes the present state as it is just after a change; false where the network has no solution. */
  begin(t: number): boolean
  /**
   * Notes the last step up to its end, with instants in between where a quantity bends or may have turned.
   *
   * @param solved the last solution of the network is that at the end of the step
   * @returns false where the network has no solution on the way
   */
  follow(solved: boolean): boolean
}

/** Departure of a plotted quantity from the straight line, in parts of its scale, above which a step is looked into. */
const coarse = 2e-3
const deepestLook = 4

export function createRecorder(system: System, courses: Courses, integrator: Integrator): Recorder {
  const length = observationLength(system)
  const observe = createObserver(system)
  const scale = plotScales(system)
  const samples = sampleStore(length)
  const scratch = new Float64Array(system.stateLength)
  const now = new Float64Array(length)
  /** Ends of the last two steps of a smooth stretch. */
  let [older, old] = [new Float64Array(length), new Float64Array(length)]
  let [olderTime, oldTime] = [0, 0]
  let known = 0
  const middles = Array.from({ length: deepestLook + 1 }, () => new Float64Array(length))
  let largestMismatch = 0

  const observeAt = (t: number, into: Float64Array): boolean => {
    integrator.interpolate(t, scratch)
    system.setTime(t)
    if (!system.solveAt(scratch)) return false
    observe(scratch, into)
    return true
  }
  const search = createExtremeSearch(allWatches(courses), length, observeAt)

  /** Whether the middle of three observations lies off the line between the others in any channel. */
  function bends(t0: number, a: Float64Array, t1: number, b: Float64Array, t2: number, c: Float64Array): boolean {
    const part = (t1 - t0) / (t2 - t0)
    for (let k = 0; k < length; k++) {
      if (Math.abs(b[k]! - a[k]! - part * (c[k]! - a[k]!)) > coarse * scale[k]!) return true
    }
    return false
  }

  function note(t: number, observation: Float64Array): void {
    addSample(samples, t, observation)
    search.add(t, observation)
  }

  /** Observes between two instants of the last step, closer where a line bends; the ends are noted by the caller. */
  function lookBetween(t0: number, a: Float64Array, t2: number, c: Float64Array, depth: number): boolean {
    const middle = middles[depth]!
    const t = (t0 + t2) / 2
    if (!observeAt(t, middle)) return false
    const closer = depth > 0 && bends(t0, a, t, middle, t2, c)
    if (closer && !lookBetween(t0, a, t, middle, depth - 1)) return false
    note(t, middle)
    return !closer || lookBetween(t, middle, t2, c, depth - 1)
  }

  function shift(t: number): void {
    const recycled = older
    older = old
    old = recycled
    old.set(now)
    olderTime = oldTime
    oldTime = t
    known++
  }

  return {
    samples,
    now,
    get largestMismatch() {
      return largestMismatch
    },
    begin(t) {
      const { state } = integrator
      system.setTime(t)
      if (!system.solveAt(state)) return false
      observe(state, now)
      largestMismatch = Math.max(largestMismatch, system.solver.mismatch())
      search.breakHere()
      note(t, now)
      known = 0
      shift(t)
      return true
    },
    follow(solved) {
      const { state, time } = integrator
      system.setTime(time)
      if (!solved && !system.solveAt(state)) return false
      observe(state, now)
      largestMismatch = Math.max(largestMismatch, system.solver.mismatch())
      const look = known < 2 || !solved || bends(olderTime, older, oldTime, old, time, now)
      if (time > oldTime) {
        if (look && !lookBetween(oldTime, old, time, now, deepestLook)) return false
        note(time, now)
      }
      shift(time)
      return true
    },
  }
}

function allWatches(courses: Courses): Watch[] {
  return [
    ...courses.buses.flatMap((bus) => [bus.deepest, bus.highest]),
    ...courses.starts.flatMap((start) => Object.values<Watch>(start.watches)),
    ...courses.running.flatMap((running) => Object.values<Watch>(running.watches)),
    ...Object.values<Watch>(courses.generator?.watches ?? {}),
  ]
}

/** What counts as one whole on a plot of each channel. */
export function plotScales(system: System): Float64Array {
  const scale = new Float64Array(observationLength(system))
  system.plant.input.buses.forEach((bus, b) => {
    scale[b] = 0.1 * bus.nominal
  })
  system.plant.motors.forEach((motor, i) => {
    const current = motor.ratedPower / motor.ratedVoltage
    scale[placeOf(system, i, 'speed')] = motor.ratedSpeed
    scale[placeOf(system, i, 'torque')] = motor.ratedTorque
    scale[placeOf(system, i, 'loadTorque')] = motor.ratedTorque
    scale[placeOf(system, i, 'accelerating')] = motor.ratedTorque
    scale[placeOf(system, i, 'lineCurrent')] = 2 * current
    scale[placeOf(system, i, 'motorCurrent')] = 2 * current
    scale[placeOf(system, i, 'motorVoltage')] = motor.ratedVoltage
    scale[placeOf(system, i, 'active')] = 2 * motor.ratedPower
    scale[placeOf(system, i, 'reactive')] = 2 * motor.ratedPower
  })
  if (!generators(system)) return scale
  const { supply, disturbance, frequency } = system.plant.input
  const set = (supply.generator ?? disturbance?.to?.generator)!
  scale[generatorPlace(system, 'frequency')] = 0.05 * frequency
  scale[generatorPlace(system, 'excitation')] = 2 * set.ratedVoltage
  scale[generatorPlace(system, 'room')] = 2 * set.ratedVoltage
  scale[generatorPlace(system, 'power')] = set.ratedPower
  return scale
}
