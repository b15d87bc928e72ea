import type { Connections } from './connection'
import type { Link } from './position'

/** Settings kept a motor; what they mean follows its device. */
export const width = 12

/** Voltage ramp 0 or torque ramp 1, begin, end, length in s, current limit in A (0: none). */
export const softStartSettings = ({ ramp, time, currentLimit }: Extract<Link, { kind: 'soft' }>): number[] => [
  ramp.kind === 'torque' ? 1 : 0,
  ramp.from,
  ramp.to,
  time,
  currentLimit ?? 0,
]

/**
 * Soft starter that passes the part k of the bus voltage U on to a motor of impedance R + jX_m, without losses: the
 * current is the same on both sides and active power is conserved, so the bus sees R + jX with R² + X² = |Z_m|²/k².
 *
 * k follows the ramp of voltage, or of torque with k² = T/T(U), and is held down so that U/(√3·|R + jX|) does not
 * exceed the current limit. k never exceeds 1. Harmonics are left out. Source: conservation of active power.
 *
 * @param re admittance of the motor, S
 * @param square U², V²
 * @param t case time, s
 * @param torqueAtFull torque in N·m with the whole of U at the motor
 */
export function evaluateSoftStart(
  connection: Connections,
  i: number,
  re: number,
  im: number,
  square: number,
  t: number,
  torqueAtFull: number,
): void {
  const at = width * i
  const { settings } = connection
  const time = settings[at + 3]!
  const passed = time > 0 ? (t - connection.since[i]!) / time : 1
  const part = Math.min(1, Math.max(0, passed))
  const asked = settings[at + 1]! + (settings[at + 2]! - settings[at + 1]!) * part
  let share = asked * asked
  if (settings[at] === 1) share = torqueAtFull > asked ? asked / torqueAtFull : 1
  const y = re * re + im * im
  const own = 1 / y
  let size = share < 1 ? own / share : own
  const limit = settings[at + 4]!
  if (limit > 0) {
    const least = square / (3 * limit * limit)
    if (least > size) size = least
  }
  const r = re * own
  const x = Math.sqrt(Math.max(0, size - r * r))
  connection.admittance[2 * i] = r / size
  connection.admittance[2 * i + 1] = -x / size
  connection.winding[i] = own / size
  connection.terminal[i] = Math.sqrt(own / size)
}
