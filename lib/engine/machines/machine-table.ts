import { isTabulated, type MachineModel } from '../case-input'
import { type CurveMachine, curveMachine } from './curve-machine'
import { type DeepBarLaw, deepBarLaw } from './deep-bar'

/**
 * Machines in arrays, for the hot loop. Row of `stride` numbers a circuit:
 * 0 r_s, 1 x_s, 2 1/x_m, 3 1/r_c (0 without core loss), 4 r_1, 5 x_1, 6 r_2, 7 x_2 (r_2 = 0: no second cage), in ohm or siemens.
 */
export interface MachineTable {
  count: number
  circuit: Float64Array
  /** 1 where a machine is more than the circuit in its row. */
  special: Uint8Array
  /** Frequency in parts of rated, for the special ones; the reactances in `circuit` are rewritten with it. */
  frequency: number
  deepBars: readonly (DeepBarLaw | null)[]
  /** Machines, or their torque alone, by typed curves. */
  curves: readonly (CurveMachine | null)[]
  /** Star admittance seen at the terminals, S: re, im of each machine; written by `evaluateMachine`. */
  admittance: Float64Array
  /** Airgap power at one volt line to line, W/V². */
  airgap: Float64Array
}

const stride = 8

/** The numbers of a circuit; a machine known by its curves has none, and a resistance of one that is never looked at. */
const rowOf = (model: MachineModel): readonly number[] => {
  if (isTabulated(model)) return [0, 0, 0, 0, 1, 0, 0, 0]
  const { stator, magnetising, core, cages } = model
  return [
    stator.re,
    stator.im,
    1 / magnetising,
    core === null ? 0 : 1 / core,
    cages[0]!.resistance,
    cages[0]!.reactance,
    cages[1]?.resistance ?? 0,
    cages[1]?.reactance ?? 0,
  ]
}

/**
 * Lays machines out for calculation.
 *
 * @param synchronous synchronous speed of each, rad/s; needed where a machine has typed curves
 */
export function machineTable(models: readonly MachineModel[], synchronous: ArrayLike<number> = []): MachineTable {
  const curves = models.map((model, i) => {
    const curve = isTabulated(model) ? model : model.torqueCurve
    return curve ? curveMachine(curve, synchronous[i] ?? Number.NaN) : null
  })
  const deepBars = models.map((model) => (isTabulated(model) ? null : deepBarLaw(model)))
  return {
    count: models.length,
    circuit: Float64Array.from(models.flatMap(rowOf)),
    special: Uint8Array.from(models, (_, i) => (curves[i] || deepBars[i] ? 1 : 0)),
    frequency: 1,
    deepBars,
    curves,
    admittance: new Float64Array(2 * models.length),
    airgap: new Float64Array(models.length),
  }
}

/**
 * Admittance y and airgap power of machine i at slip s, any s including 0 and negative (generator) for circuits.
 *
 * Y_r = Σ s/(R + jsX); Y_e = Y_r + 1/(jX_m) + 1/R_c; k = 1/(1 + Z_s·Y_e); y = Y_e·k; P_ag/V² = |k|²·Re Y_r.
 * Source: the exact T circuit of any textbook on induction machines. Typed curves hold their end values outside their
 * range; the run-up looks whether a machine has left it (`isOutside`).
 */
export function evaluateMachine(table: MachineTable, i: number, slip: number): void {
  const c = table.circuit
  const at = stride * i
  let r1 = c[at + 4]!
  let x1 = c[at + 5]!
  if (table.special[i] === 1) {
    const curve = table.curves[i]!
    if (curve?.current) {
      curve.write(table.admittance, table.airgap, i, slip)
      if (table.frequency !== 1) atFrequency(table, i)
      return
    }
    const law = table.deepBars[i]
    if (law) {
      const f = table.frequency
      r1 += law.addedResistance(slip * f)
      x1 = f * law.reactance(slip * f)
    }
  }
  const sx1 = slip * x1
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
  const curve = table.special[i] === 1 ? table.curves[i] : null
  table.airgap[i] = curve ? curve.airgap(slip) / table.frequency : inverse * rotorRe
}

/** Curves at the flux of another frequency: I ∝ U/f, and T ∝ (U/f)², which with T = P/ω_s is P ∝ U²/f. */
function atFrequency({ admittance, airgap, frequency }: MachineTable, i: number): void {
  admittance[2 * i] = admittance[2 * i]! / frequency
  admittance[2 * i + 1] = admittance[2 * i + 1]! / frequency
  airgap[i] = airgap[i]! / frequency
}

/** Reactances of every circuit at a frequency in parts of rated, from those at rated frequency. */
export function setMachineFrequency(table: MachineTable, rated: Float64Array, part: number): void {
  table.frequency = part
  const { circuit } = table
  for (let at = 0; at < circuit.length; at += stride) {
    circuit[at + 1] = part * rated[at + 1]!
    circuit[at + 2] = rated[at + 2]! / part
    circuit[at + 5] = part * rated[at + 5]!
    circuit[at + 7] = part * rated[at + 7]!
  }
}

/** Whether a machine with typed curves is at a slip that they do not reach. */
export const isOutside = (table: MachineTable, i: number, slip: number): boolean =>
  table.special[i] === 1 && table.curves[i] !== null && !table.curves[i]!.reaches(slip)
