import type { Ohm, PerUnit, Second, Volt, VoltAmpere, Watt } from '../units/si'
import type { CaseInput } from './case-input'

/** Voltage regulator with exciter: first order, its output between zero and the ceiling; with a reset time it takes up the whole error. */
export interface VoltageRegulator {
  /** Excitation over voltage error, both in parts of rated voltage. */
  gain: number
  /** Time constant of regulator and exciter together. */
  time: Second
  /** Time in which a lasting error doubles the answer to it; null: none, a lasting error remains. */
  reset: Second | null
  /** Largest excitation, as the open-circuit voltage that it would give at rated speed, in parts of rated voltage. */
  ceiling: PerUnit
  /** The exciter is fed from the terminals, so that its ceiling falls with their voltage; false: an independent or boosted source. */
  fedFromTerminals: boolean
}

/** Speed governor with the prime mover behind it: first order, its output between zero and the largest power. */
export interface SpeedGovernor {
  /** Fall of speed from no load to rated apparent power, in parts of rated speed. */
  droop: PerUnit
  time: Second
  largestPower: Watt
}

/** Synchronous generator that supplies a plant by itself, in ohm per phase at rated frequency; saturation left out. */
export interface GeneratorInput {
  ratedPower: VoltAmpere
  ratedVoltage: Volt
  resistance: Ohm
  /** X_d, X′_d and the open-circuit time constant T′_d0. */
  synchronous: Ohm
  transient: Ohm
  transientTime: Second
  /** X″_d and the short-circuit time constant T″_d; null where unknown: the first instant is then behind X′_d. */
  subtransient: { reactance: Ohm; time: Second } | null
  /** X_q and the open-circuit time constant T″_q0 of the damper; null: no reaction in the quadrature axis. */
  quadrature: { reactance: Ohm; time: Second } | null
  /** Null: excitation held as before the start. */
  regulator: VoltageRegulator | null
  /** H, stored energy of the whole set over its rated apparent power. */
  inertia: Second
  /** Null: speed held at rated. */
  governor: SpeedGovernor | null
}

/** Whether a generator feeds the plant at some time of a case. */
export const onGenerator = ({ supply, disturbance }: CaseInput): boolean =>
  supply.generator !== undefined || disturbance?.to?.generator !== undefined
