import type { Starter } from '../case-input'
import type { MachineTable } from '../machines/machine-table'
import type { Position } from './position'

/**
 * What a starting device makes of its motor, one entry a motor.
 *
 * On tap k with own impedance z on the line side: y_line = 1/(z + 1/(k²·y)), I_line = k·I_motor, U_motor = k·(U − z·I_line).
 * In star: y_line = y/3 and a third of the torque; the current in line and at the motor terminals is the same.
 */
export interface Connections {
  /** re, im of the admittance seen from the bus, S. */
  admittance: Float64Array
  /** Square of the winding's voltage in parts of the bus voltage (torque scales with it); 1 in the running position. */
  winding: Float64Array
  /** Motor terminal voltage in parts of the bus voltage. */
  terminal: Float64Array
  /** Motor current in parts of the line current. */
  current: Float64Array
  /** 0 nothing, 1 running, 2 tap, 3 star. */
  code: Uint8Array
  /** Tap k and own impedance re, im of each motor's autotransformer. */
  tap: Float64Array
}

const codes: Record<Position, number> = { off: 0, open: 0, running: 1, tap: 2, star: 3 }

export function connections(starters: readonly (Starter | null)[]): Connections {
  const count = starters.length
  return {
    admittance: new Float64Array(2 * count),
    winding: new Float64Array(count),
    terminal: new Float64Array(count),
    current: new Float64Array(count),
    code: new Uint8Array(count),
    tap: Float64Array.from(
      starters.flatMap((starter) =>
        starter?.kind === 'autotransformer' ? [starter.tap, starter.impedance.re, starter.impedance.im] : [1, 0, 0],
      ),
    ),
  }
}

/** Moves the starting device of motor i. */
export function connect(connection: Connections, i: number, position: Position): void {
  const code = codes[position]
  connection.code[i] = code
  connection.winding[i] = code === 1 ? 1 : code === 3 ? 1 / 3 : 0
  connection.terminal[i] = code === 1 || code === 3 ? 1 : 0
  connection.current[i] = code === 2 ? 1 / connection.tap[3 * i]! : 1
  connection.admittance[2 * i] = 0
  connection.admittance[2 * i + 1] = 0
}

/** Line-side admittance and voltage shares of motor i from its admittance in the machine table. */
export function evaluateConnection(connection: Connections, machines: MachineTable, i: number): void {
  const code = connection.code[i]!
  const re = machines.admittance[2 * i]!
  const im = machines.admittance[2 * i + 1]!
  if (code === 1) {
    connection.admittance[2 * i] = re
    connection.admittance[2 * i + 1] = im
  } else if (code === 3) {
    connection.admittance[2 * i] = re / 3
    connection.admittance[2 * i + 1] = im / 3
  } else if (code === 2) {
    const k = connection.tap[3 * i]!
    const zRe = connection.tap[3 * i + 1]!
    const zIm = connection.tap[3 * i + 2]!
    const yRe = k * k * re
    const yIm = k * k * im
    const dRe = 1 + zRe * yRe - zIm * yIm
    const dIm = zRe * yIm + zIm * yRe
    const inverse = 1 / (dRe * dRe + dIm * dIm)
    connection.admittance[2 * i] = (yRe * dRe + yIm * dIm) * inverse
    connection.admittance[2 * i + 1] = (yIm * dRe - yRe * dIm) * inverse
    connection.winding[i] = k * k * inverse
    connection.terminal[i] = k * Math.sqrt(inverse)
  }
}
