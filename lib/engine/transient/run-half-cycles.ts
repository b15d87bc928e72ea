import { createIntegrator } from '../numeric/dormand-prince'
import { findRoot } from '../numeric/root'
import type { HalfCycle } from './half-cycle'
import { readState, type TransientMachine, type TransientReading, transientDerivative } from './machine-equations'

export interface HalfCycleQuestion {
  /** N·m at a speed in rad/s. */
  loadTorque: (speed: number) => number
  inertia: number
  /** Speed at switching on, rad/s; the machine has no flux. */
  from: number
  /** Speeds whose first instants are asked for, rad/s. */
  speeds: readonly number[]
  until: number
  /** The waveforms of this time after switching on are kept, s. */
  kept: number
}

export interface OpeningWaveform {
  time: number[]
  /** Space vector of the current in the stationary frame, A peak. */
  re: number[]
  im: number[]
  torque: number[]
}

export interface HalfCycleRun {
  /** Largest length of the current's space vector (A peak), where it points (rad) and when (s). */
  peak: { current: number; towards: number; at: number }
  peakTorque: { torque: number; at: number }
  lowestTorque: { torque: number; at: number }
  highestSpeed: number
  reached: readonly (number | null)[]
  opening: OpeningWaveform
  counters: { steps: number; rejected: number; evaluations: number; largestErrorRatio: number }
  /** When it ended, s. */
  at: number
}

/** Relative error allowed in a step. */
const tolerance = 1e-6
/** Looks in half a period: while the direct component lasts, and later. */
const [many, few] = [96, 16]
/** Time of many looks, s. */
const early = 0.5
/** Every so many of the many looks is kept in the waveforms. */
const keptOf = 3

/**
 * Runs a machine up from no flux by the transient model, half a period of the supply at a time.
 *
 * @param heard hears of every half period (the same object each time) and says whether to go on
 */
export function runHalfCycles(
  machine: TransientMachine,
  question: HalfCycleQuestion,
  heard: (half: HalfCycle) => boolean,
): HalfCycleRun {
  const { rotor, base, voltage } = machine
  const speedAt = 2 + 2 * rotor.length
  const state = new Float64Array(speedAt + 1)
  state[speedAt] = question.from
  const scale = new Float64Array(speedAt + 1).fill(tolerance * Math.hypot(voltage.q, voltage.d))
  scale[speedAt] = (tolerance * 2 * base) / machine.poles
  const halfPeriod = Math.PI / base
  const derivative = transientDerivative(machine, question.loadTorque, question.inertia)
  const integrator = createIntegrator(state, derivative, scale, halfPeriod / 4)
  integrator.restart(0, 0)
  const scratch = new Float64Array(speedAt + 1)
  const rate = new Float64Array(speedAt + 1)
  const reading: TransientReading = { q: 0, d: 0, torque: 0 }
  const w = new Float64Array(6)
  const reached: (number | null)[] = question.speeds.map((speed) => (question.from >= speed ? 0 : null))
  const peak = { current: 0, towards: 0, at: 0 }
  const peakTorque = { torque: Number.NEGATIVE_INFINITY, at: 0 }
  const lowestTorque = { torque: Number.POSITIVE_INFINITY, at: 0 }
  const opening: OpeningWaveform = { time: [], re: [], im: [], torque: [] }
  const half: HalfCycle = {
    from: 0,
    to: 0,
    moments: new Float64Array(36),
    mean: { re: 0, im: 0 },
    torque: { mean: 0, low: 0, high: 0 },
    peak: 0,
    rotorLoss: 0,
    speed: question.from,
  }
  let highestSpeed = question.from

  const speedOf = (t: number): number => {
    integrator.interpolate(t, scratch)
    return scratch[speedAt]!
  }

  /** Steps on until the integrator has passed t; false where it cannot. */
  function reach(t: number): boolean {
    while (integrator.time < t) {
      if (integrator.advance(question.until + 1) === 'blocked') return false
      const { from, time } = integrator
      for (let k = 0; k < reached.length; k++) {
        const goal = question.speeds[k]!
        if (reached[k] === null && state[speedAt]! >= goal)
          reached[k] = findRoot((at) => speedOf(at) - goal, from, time, 1e-9)
      }
    }
    return true
  }

  /** Loss of the rotor circuits at the state in `scratch`. */
  function rotorLoss(): number {
    const { leakage, mutual } = machine
    let [q, d] = [scratch[0]! / leakage, scratch[1]! / leakage]
    for (let k = 0; k < rotor.length; k++) {
      q += scratch[2 + 2 * k]! / rotor[k]!.reactance
      d += scratch[3 + 2 * k]! / rotor[k]!.reactance
    }
    let loss = 0
    for (let k = 0; k < rotor.length; k++) {
      const { resistance, reactance } = rotor[k]!
      const iq = (scratch[2 + 2 * k]! - mutual * q) / reactance
      const id = (scratch[3 + 2 * k]! - mutual * d) / reactance
      loss += 1.5 * resistance * (iq * iq + id * id)
    }
    return loss
  }

  /** Looks at an instant: u, p and r into `w`, peaks, and the look's share of the means of its half period. */
  function look(t: number, weight: number): void {
    integrator.interpolate(t, scratch)
    derivative(t, scratch, rate)
    readState(machine, scratch, reading)
    const { leakage, mutual } = machine
    let [q, d] = [rate[0]! / leakage, rate[1]! / leakage]
    for (let k = 0; k < rotor.length; k++) {
      q += rate[2 + 2 * k]! / rotor[k]!.reactance
      d += rate[3 + 2 * k]! / rotor[k]!.reactance
    }
    const gRe = (rate[0]! - mutual * q) / leakage / base + reading.d
    const gIm = -(rate[1]! - mutual * d) / leakage / base + reading.q
    const [cos, sin] = [Math.cos(base * t), Math.sin(base * t)]
    w[0] = cos
    w[1] = sin
    w[2] = reading.q * cos + reading.d * sin
    w[3] = reading.q * sin - reading.d * cos
    w[4] = gRe * cos - gIm * sin
    w[5] = gRe * sin + gIm * cos
    const { moments, mean, torque } = half
    for (let i = 0; i < 6; i++)
      for (let j = i; j < 6; j++) moments[6 * i + j] = moments[6 * i + j]! + weight * w[i]! * w[j]!
    mean.re += weight * w[2]
    mean.im += weight * w[3]
    torque.mean += weight * reading.torque
    torque.low = Math.min(torque.low, reading.torque)
    torque.high = Math.max(torque.high, reading.torque)
    half.rotorLoss += weight * rotorLoss()
    const length = Math.hypot(w[2], w[3])
    half.peak = Math.max(half.peak, length)
    if (length > peak.current) Object.assign(peak, { current: length, towards: Math.atan2(w[3], w[2]), at: t })
    if (reading.torque > peakTorque.torque) Object.assign(peakTorque, { torque: reading.torque, at: t })
    if (reading.torque < lowestTorque.torque) Object.assign(lowestTorque, { torque: reading.torque, at: t })
    highestSpeed = Math.max(highestSpeed, scratch[speedAt]!)
  }

  function keep(t: number): void {
    opening.time.push(t)
    opening.re.push(w[2]!)
    opening.im.push(w[3]!)
    opening.torque.push(reading.torque)
  }

  for (let n = 0; n * halfPeriod < question.until; n++) {
    const from = n * halfPeriod
    const looks = from < early ? many : few
    half.from = from
    half.to = from + halfPeriod
    half.moments.fill(0)
    Object.assign(half.mean, { re: 0, im: 0 })
    Object.assign(half.torque, { mean: 0, low: Number.POSITIVE_INFINITY, high: Number.NEGATIVE_INFINITY })
    half.peak = 0
    half.rotorLoss = 0
    for (let k = 0; k <= looks; k++) {
      const t = from + (k * halfPeriod) / looks
      if (!reach(t)) break
      // Simpson's rule.
      look(t, (k === 0 || k === looks ? 1 : k % 2 === 1 ? 4 : 2) / (3 * looks))
      if (from < question.kept && k < looks && k % keptOf === 0) keep(t)
    }
    for (let i = 0; i < 6; i++) for (let j = 0; j < i; j++) half.moments[6 * i + j] = half.moments[6 * j + i]!
    half.speed = scratch[speedAt]!
    if (!heard(half)) break
  }
  return {
    peak,
    peakTorque,
    lowestTorque,
    highestSpeed,
    reached,
    opening,
    counters: integrator.counters,
    at: half.to,
  }
}
