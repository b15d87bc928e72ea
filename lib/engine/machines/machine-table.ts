import type { InductionCircuit } from '../case-input'

/**
 * Circuits of many machines in one array, for the hot loop. Row of `stride` numbers a machine:
 * 0 r_s, 1 x_s, 2 1/x_m, 3 1/r_c (0 without core loss), 4 r_1, 5 x_1, 6 r_2, 7 x_2 (r_2 = 0: no second cage), in ohm or siemens.
 */
export interface MachineTable {
  count: number
  circuit: Float64Array
  /** Star admittance seen at the terminals, S: re, im of each machine; written by `evaluateMachine`. */
  admittance: Float64Array
  /** Airgap power at one volt line to line, W/V². */
  airgap: Float64Array
}

const stride = 8

export function machineTable(circuits: readonly InductionCircuit[]): MachineTable {
  return {
    count: circuits.length,
    circuit: Float64Array.from(
      circuits.flatMap((circuit) => [
        circuit.stator.re,
        circuit.stator.im,
        1 / circuit.magnetising,
        circuit.core === null ? 0 : 1 / circuit.core,
        circuit.cages[0]!.resistance,
        circuit.cages[0]!.reactance,
        circuit.cages[1]?.resistance ?? 0,
        circuit.cages[1]?.reactance ?? 0,
      ]),
    ),
    admittance: new Float64Array(2 * circuits.length),
    airgap: new Float64Array(circuits.length),
  }
}

/**
 * Admittance y and airgap power of machine i at slip s, any s including 0 and negative (generator).
 *
 * Y_r = Σ s/(R + jsX); Y_e = Y_r + 1/(jX_m) + 1/R_c; k = 1/(1 + Z_s·Y_e); y = Y_e·k; P_ag/V² = |k|²·Re Y_r.
 * Source: the exact T circuit of any textbook on induction machines.
 */
export function evaluateMachine(table: MachineTable, i: number, slip: number): void {
  const c = table.circuit
  const at = stride * i
  const r1 = c[at + 4]!
  const sx1 = slip * c[at + 5]!
  const part1 = slip / (r1 * r1 + sx1 * sx1)
  let rotorRe = part1 * r1
  let rotorIm = -part1 * sx1
  const r2 = c[at + 6]!
  if (r2 > 0) {
    const sx2 = slip * c[at + 7]!
    const part2 = slip / (r2 * r2 + sx2 * sx2)
    rotorRe += part2 * r2
    rotorIm -= part2 * sx2
  }
  const innerRe = rotorRe + c[at + 3]!
  const innerIm = rotorIm - c[at + 2]!
  const rs = c[at]!
  const xs = c[at + 1]!
  const dRe = 1 + rs * innerRe - xs * innerIm
  const dIm = rs * innerIm + xs * innerRe
  const inverse = 1 / (dRe * dRe + dIm * dIm)
  table.admittance[2 * i] = (innerRe * dRe + innerIm * dIm) * inverse
  table.admittance[2 * i + 1] = (innerIm * dRe - innerRe * dIm) * inverse
  table.airgap[i] = inverse * rotorRe
}
