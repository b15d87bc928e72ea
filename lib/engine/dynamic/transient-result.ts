import type { Ampere, Complex, NewtonMetre, Ohm, Second, Volt } from '../../units/si'

/** What the fifth-order model gives of a start beyond the tables of every case. */
export interface TransientStartResult {
  motorId: string
  /** Angle of phase a's voltage at switching on that the figures hold for, rad; null: the worst of all for each. */
  switchingAngle: number | null
  /** Angle at which phase a has the largest peak of current, rad. */
  worstAngle: number
  /** EMF and impedance of the network at the motor's bus at switching on. */
  equivalent: { emf: Volt; impedance: Complex<Ohm> }
  /** Of the lowest phase at the motor's bus, RMS over the first half and the first whole period. */
  firstHalfPeriod: Volt
  firstPeriod: Volt
  /** Largest RMS current of a phase over half a period, with its direct component. */
  largestCurrent: { current: Ampere; at: Second }
  /** Direct component of the current over the first period, and the time constant it decays with at first. */
  direct: { current: Ampere; timeConstant: Second }
  /** Torque averaged over whole periods: greatest and least on the way. */
  peakTorque: { torque: NewtonMetre; at: Second }
  lowestTorque: { torque: NewtonMetre; at: Second }
}

/** Curves by half periods, and the first periods as they are; case time, A, N·m. */
export interface TransientSeries {
  motorId: string
  time: readonly number[]
  /** RMS of the highest phase, and largest instantaneous value of any. */
  current: readonly number[]
  peak: readonly number[]
  /** Over the whole period that ends there. */
  torqueLow: readonly number[]
  torque: readonly number[]
  torqueHigh: readonly number[]
  opening: { time: readonly number[]; current: readonly number[]; torque: readonly number[] }
}
