import { createIntegrator } from '../numeric/dormand-prince'
import { findRoot } from '../numeric/root'
import { readState, type TransientMachine, type TransientReading, transientDerivative } from './machine-equations'

/** Greatest and least of what a transient start passes through. */
export interface TransientStart {
  /** Largest length of the current's space vector, A peak, and when, s. */
  peakVector: { current: number; at: number }
  /** Largest current of phase a, A peak: that of the given switching angle. */
  peakPhase: { current: number; at: number }
  peakTorque: { torque: number; at: number }
  lowestTorque: { torque: number; at: number }
  highestSpeed: number
  /** First instant at which each of the asked speeds was reached, s; null where it was not. */
  reached: readonly (number | null)[]
  /** State at the end: fluxes, then the speed in rad/s. */
  state: Float64Array
  steps: number
}

export interface TransientQuestion {
  loadTorque: (speed: number) => number
  inertia: number
  /** Speed at switching on, rad/s; the machine has no flux. */
  from: number
  /** Speeds whose instants are asked for, rad/s. */
  speeds: readonly number[]
  /** End of the calculation, s; it ends earlier when every speed was reached and `whole` is not set. */
  until: number
  whole: boolean
}

/** Relative error allowed in a step, and looks at the currents in a period of the supply. */
const tolerance = 1e-7
const looks = 192

/** Runs a machine up from no flux by the transient model, the supply switched on at once. */
export function transientStart(machine: TransientMachine, question: TransientQuestion): TransientStart {
  const { rotor, base, voltage } = machine
  const speedAt = 2 + 2 * rotor.length
  const state = new Float64Array(speedAt + 1)
  state[speedAt] = question.from
  const flux = Math.hypot(voltage.q, voltage.d)
  const scale = new Float64Array(speedAt + 1).fill(tolerance * flux)
  scale[speedAt] = (tolerance * 2 * base) / machine.poles
  const period = (2 * Math.PI) / base
  const integrator = createIntegrator(
    state,
    transientDerivative(machine, question.loadTorque, question.inertia),
    scale,
    period / 8,
  )
  integrator.restart(0, 0)
  const scratch = new Float64Array(speedAt + 1)
  const reading: TransientReading = { q: 0, d: 0, torque: 0 }
  const reached: (number | null)[] = question.speeds.map((speed) => (question.from >= speed ? 0 : null))
  const result = {
    peakVector: { current: 0, at: 0 },
    peakPhase: { current: 0, at: 0 },
    peakTorque: { torque: Number.NEGATIVE_INFINITY, at: 0 },
    lowestTorque: { torque: Number.POSITIVE_INFINITY, at: 0 },
    highestSpeed: question.from,
  }

  function look(t: number): void {
    integrator.interpolate(t, scratch)
    readState(machine, scratch, reading)
    const vector = Math.hypot(reading.q, reading.d)
    const phase = Math.abs(reading.q * Math.cos(base * t) + reading.d * Math.sin(base * t))
    if (vector > result.peakVector.current) result.peakVector = { current: vector, at: t }
    if (phase > result.peakPhase.current) result.peakPhase = { current: phase, at: t }
    if (reading.torque > result.peakTorque.torque) result.peakTorque = { torque: reading.torque, at: t }
    if (reading.torque < result.lowestTorque.torque) result.lowestTorque = { torque: reading.torque, at: t }
    result.highestSpeed = Math.max(result.highestSpeed, scratch[speedAt]!)
  }

  const speedOf = (t: number): number => {
    integrator.interpolate(t, scratch)
    return scratch[speedAt]!
  }

  while (integrator.time < question.until) {
    if (integrator.advance(question.until) === 'blocked') break
    const { from, time } = integrator
    const points = Math.max(2, Math.ceil(((time - from) * looks) / period))
    for (let k = 1; k <= points; k++) look(from + ((time - from) * k) / points)
    question.speeds.forEach((speed, i) => {
      if (reached[i] !== null || state[speedAt]! < speed) return
      reached[i] = findRoot((t) => speedOf(t) - speed, from, time, 1e-9)
    })
    if (!question.whole && question.speeds.length > 0 && reached.every((at) => at !== null)) break
  }
  return { ...result, reached, state, steps: integrator.counters.steps }
}
