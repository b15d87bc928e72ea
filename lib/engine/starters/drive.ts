import type { DriveStarter } from '../starter-input'
import type { Connections } from './connection'
import { width } from './soft-start'

/** Time in s in which the speed control takes up a departure from the ramp. */
const control = 0.05
/** Part of rated voltage below which a drive without undervoltage trip is taken as an impedance. */
const floor = 0.5

/** What a drive must know of the machine it turns: rated torque in N·m, inertia at the shaft in kg·m², rated voltage in V. */
export interface DrivenMachine {
  ratedTorque: number
  inertia: number
  ratedVoltage: number
}

/** Largest torque in N·m that the limits of torque and current allow; current is √(magnetising² + (torque share)²). */
export function largestTorque(drive: DriveStarter, ratedTorque: number): number {
  const m = drive.magnetising
  const byTorque = drive.torqueLimit ?? Number.POSITIVE_INFINITY
  if (drive.currentLimit === null) return byTorque
  const share = ((drive.currentLimit / drive.ratedCurrent) ** 2 - m * m) / (1 - m * m)
  return Math.min(byTorque, ratedTorque * Math.sqrt(Math.max(0, share)))
}

/**
 * Set speed, ramp time, largest torque, rated torque, inertia, magnetising part, rated losses, tan of the displacement
 * angle, total power factor, rated current, rotor loss at rated torque, least square of voltage.
 */
export const driveSettings = (drive: DriveStarter, machine: DrivenMachine): number[] => [
  drive.speed,
  drive.rampTime,
  largestTorque(drive, machine.ratedTorque),
  machine.ratedTorque,
  machine.inertia,
  drive.magnetising,
  drive.losses,
  Math.sqrt(1 / drive.displacementFactor ** 2 - 1),
  drive.totalFactor,
  drive.ratedCurrent,
  (drive.ratedSlip / (1 - drive.ratedSlip)) * machine.ratedTorque * drive.speed,
  (drive.undervoltage ?? floor * machine.ratedVoltage) ** 2,
]

/**
 * Drive that turns its motor along a ramp of speed: torque = load + J·(slope of the ramp + departure/0.05 s), between 0
 * and its limit. The supply sees P = T·ω + losses·(m² + (1 − m²)(T/T_r)²), Q = P·tan φ at any voltage, so its current
 * rises as the voltage falls; below the undervoltage level, where it would trip, it is an impedance. The line current
 * includes harmonics (total power factor); the network is solved with the fundamental.
 *
 * @param i motor
 * @param speed rad/s
 * @param load load torque at that speed, N·m
 * @param square square of the bus voltage, V²
 * @param t case time, s
 */
export function evaluateDrive(
  connection: Connections,
  i: number,
  speed: number,
  load: number,
  square: number,
  t: number,
): void {
  const at = width * i
  const s = connection.settings
  const passed = t - connection.since[i]!
  const rampTime = s[at + 1]!
  const ramping = passed < rampTime
  const slope = ramping ? s[at]! / rampTime : 0
  const wanted = ramping ? slope * passed : s[at]!
  const asked = load + s[at + 4]! * (slope + (wanted - speed) / control)
  const torque = Math.max(0, Math.min(s[at + 2]!, asked))
  const share = torque / s[at + 3]!
  const m = s[at + 5]! * s[at + 5]!
  const currentShare = m + (1 - m) * share * share
  const power = Math.max(0, torque * speed) + s[at + 6]! * currentShare
  const reference = Math.max(square, s[at + 11]!)
  connection.admittance[2 * i] = power / reference
  connection.admittance[2 * i + 1] = (-power * s[at + 7]!) / reference
  connection.torque[i] = torque
  connection.motorSquare[i] = s[at + 9]! * s[at + 9]! * currentShare
  const whole = power / s[at + 8]! / reference
  connection.lineSquare[i] = (whole * whole * square) / 3
  connection.slipLoss[i] = s[at + 10]! * share * share
}
