import type { MachineTable } from '../machines/machine-table'
import { type DrivenMachine, driveSettings } from './drive'
import type { Step } from './position'
import { evaluateSoftStart, softStartSettings, width } from './soft-start'

/**
 * What a starting device makes of its motor, one entry a motor.
 *
 * On tap k with own impedance z on the line side: y_line = 1/(z + 1/(k²·y)), I_line = k·I_motor, U_motor = k·(U − z·I_line).
 * In star: y_line = y/3 and a third of the torque; the current in line and at the motor terminals is the same.
 * Behind an impedance z: y_line = y/(1 + z·y). On part of the winding: stated shares of current and torque.
 */
export interface Connections {
  /** re, im of the admittance that motor and device show the bus, S. */
  admittance: Float64Array
  /** Square of the winding's voltage in parts of the bus voltage (torque scales with it); 1 in the running position. */
  winding: Float64Array
  /** Motor terminal voltage in parts of the bus voltage. */
  terminal: Float64Array
  /** Motor current in parts of the line current. */
  current: Float64Array
  /** What stands between bus and motor: see `codes`. 0 draws nothing. */
  code: Uint8Array
  /** Numbers of the present position, `width` a motor; their meaning follows the code. */
  settings: Float64Array
  /** When the present position was taken, s. */
  since: Float64Array
  /** Susceptance of capacitors that are in with the motor, S. */
  shunt: Float64Array
  /** Part of the rotor's slip loss that falls in the rotor itself. */
  ownRotor: Float64Array
  /** Of a motor on a drive: torque in N·m, square of its current and of the line's in A², loss in its rotor in W. */
  torque: Float64Array
  motorSquare: Float64Array
  lineSquare: Float64Array
  slipLoss: Float64Array
  /** Frequency in parts of rated, with which the reactances of devices go. */
  frequency: number
}

export const codes = { nothing: 0, direct: 1, tap: 2, star: 3, series: 4, part: 5, soft: 6, drive: 7 } as const

export function connections(count: number): Connections {
  return {
    admittance: new Float64Array(2 * count),
    winding: new Float64Array(count),
    terminal: new Float64Array(count),
    current: new Float64Array(count).fill(1),
    code: new Uint8Array(count),
    settings: new Float64Array(width * count),
    since: new Float64Array(count),
    shunt: new Float64Array(count),
    ownRotor: new Float64Array(count).fill(1),
    torque: new Float64Array(count),
    motorSquare: new Float64Array(count),
    lineSquare: new Float64Array(count),
    slipLoss: new Float64Array(count),
    frequency: 1,
  }
}

/** Takes motor i off the line. */
export function disconnect(connection: Connections, i: number): void {
  connection.code[i] = codes.nothing
  connection.winding[i] = 0
  connection.terminal[i] = 0
  connection.current[i] = 1
  connection.admittance[2 * i] = 0
  connection.admittance[2 * i + 1] = 0
}

/** Brings the starting device of motor i into a position at time t. */
export function connect(
  connection: Connections,
  i: number,
  { link }: Pick<Step, 'link'>,
  t: number,
  machine: DrivenMachine,
): void {
  disconnect(connection, i)
  connection.since[i] = t
  const set = (...values: number[]): void => connection.settings.set(values, width * i)
  switch (link.kind) {
    case 'open':
      return
    case 'direct':
      connection.code[i] = codes.direct
      connection.winding[i] = 1
      connection.terminal[i] = 1
      return
    case 'star':
      connection.code[i] = codes.star
      connection.winding[i] = 1 / 3
      connection.terminal[i] = 1
      return
    case 'part':
      connection.code[i] = codes.part
      connection.winding[i] = link.torque
      connection.terminal[i] = 1
      set(link.current)
      return
    case 'tap':
      connection.code[i] = codes.tap
      connection.current[i] = 1 / link.tap
      set(link.tap, link.impedance.re, link.impedance.im)
      return
    case 'series':
      connection.code[i] = codes.series
      set(1, link.impedance.re, link.impedance.im)
      return
    case 'soft':
      connection.code[i] = codes.soft
      set(...softStartSettings(link))
      return
    case 'drive':
      connection.code[i] = codes.drive
      set(...driveSettings(link.drive, machine))
  }
}

/** Whether what a device shows the bus depends on the voltage there, so that network and device are solved in turns. */
export const isRegulated = ({ code, settings }: Connections, i: number): boolean =>
  code[i] === codes.drive || (code[i] === codes.soft && (settings[width * i]! > 0 || settings[width * i + 4]! > 0))

/**
 * Line-side admittance and voltage shares of motor i from its admittance in the machine table; not for drives.
 *
 * @param square square of the bus voltage, V²; only soft starters with a limit look at it
 * @param t case time, s; only ramps look at it
 * @param torqueAtFull torque in N·m at full bus voltage; only torque ramps look at it
 */
export function evaluateConnection(
  connection: Connections,
  machines: MachineTable,
  i: number,
  square = 1,
  t = 0,
  torqueAtFull = 0,
): void {
  const code = connection.code[i]!
  const re = machines.admittance[2 * i]!
  const im = machines.admittance[2 * i + 1]!
  if (code === codes.direct) {
    connection.admittance[2 * i] = re
    connection.admittance[2 * i + 1] = im
  } else if (code === codes.star) {
    connection.admittance[2 * i] = re / 3
    connection.admittance[2 * i + 1] = im / 3
  } else if (code === codes.part) {
    const share = connection.settings[width * i]!
    connection.admittance[2 * i] = share * re
    connection.admittance[2 * i + 1] = share * im
  } else if (code === codes.tap || code === codes.series) {
    const k = connection.settings[width * i]!
    const zRe = connection.settings[width * i + 1]!
    const zIm = connection.settings[width * i + 2]! * connection.frequency
    const yRe = k * k * re
    const yIm = k * k * im
    const dRe = 1 + zRe * yRe - zIm * yIm
    const dIm = zRe * yIm + zIm * yRe
    const inverse = 1 / (dRe * dRe + dIm * dIm)
    connection.admittance[2 * i] = (yRe * dRe + yIm * dIm) * inverse
    connection.admittance[2 * i + 1] = (yIm * dRe - yRe * dIm) * inverse
    connection.winding[i] = k * k * inverse
    connection.terminal[i] = k * Math.sqrt(inverse)
  } else if (code === codes.soft) {
    evaluateSoftStart(connection, i, re, im, square, t, torqueAtFull)
  }
}
