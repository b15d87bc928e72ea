import { ohm } from '../../units/si'
import type { InductionCircuit } from '../case-input'
import type { PlateInPerUnit } from './nameplate'

/**
 * The unknowns of the fit, all logarithms of per-unit values: r_s, x_s, x_m, r_c, r₁, r₂/r₁ − 1, x₂, x₁/x₂ − 1.
 * In this form every vector is a circuit with r₁ ≤ r₂ and x₂ ≤ x₁.
 */
export type Unknowns = Float64Array

export const unknownNames = ['r_s', 'x_s', 'x_m', 'r_c', 'r₁', 'r₂/r₁', 'x₂', 'x₁/x₂'] as const

export type UnknownName = (typeof unknownNames)[number]

/** Where a cage motor of 11 kW to 15 MW can lie, per unit on P/(η·cos φ) (common practice, no source). */
const box: readonly (readonly [number, number])[] = [
  [0.001, 0.12],
  [0.02, 0.35],
  [0.7, 12],
  [4, 2000],
  [0.002, 0.15],
  [0.02, 80],
  [0.02, 0.35],
  [0.02, 20],
]

export const lowest: Unknowns = Float64Array.from(box, ([low]) => Math.log(low))
export const highest: Unknowns = Float64Array.from(box, ([, high]) => Math.log(high))

/** How far from the plain guess an unknown may lie before it counts, as a factor's logarithm. */
export const looseness: Unknowns = Float64Array.from([0.4, 0.4, 1, 0.8, 0.5, 0.8, 0.4, 0.8])

/** The circuit of the unknowns, with this many ohm in one per unit (1 Ω keeps it in per unit). */
export const toCircuit = (unknowns: Unknowns, base: number): InductionCircuit => {
  const of = (index: number): number => Math.exp(unknowns[index]!)
  return {
    stator: { re: ohm(of(0) * base), im: ohm(of(1) * base) },
    magnetising: ohm(of(2) * base),
    core: ohm(of(3) * base),
    cages: [
      { resistance: ohm(of(4) * base), reactance: ohm(of(6) * (1 + of(7)) * base) },
      { resistance: ohm(of(4) * (1 + of(5)) * base), reactance: ohm(of(6) * base) },
    ],
  }
}

/**
 * Writes the circuit of the unknowns, in per unit, into the first row of a machine table, whose layout is said there:
 * what the search does thousands of times without making an object.
 */
export const writeCircuit = (row: Float64Array, unknowns: Unknowns): void => {
  const inner = Math.exp(unknowns[4]!)
  const outerReactance = Math.exp(unknowns[6]!)
  row[0] = Math.exp(unknowns[0]!)
  row[1] = Math.exp(unknowns[1]!)
  row[2] = Math.exp(-unknowns[2]!)
  row[3] = Math.exp(-unknowns[3]!)
  row[4] = inner
  row[5] = outerReactance * (1 + Math.exp(unknowns[7]!))
  row[6] = inner * (1 + Math.exp(unknowns[5]!))
  row[7] = outerReactance
}

const clamp = (value: number, low: number, high: number): number => Math.min(high, Math.max(low, value))

/** The plainest circuit that such a plate suggests: losses shared by halves, leakage shared by halves. */
export const plainGuess = (plate: PlateInPerUnit): Unknowns => {
  const { slip, shaftPower, efficiency, powerFactor, lockedRotorCurrent: current } = plate
  const airgap = shaftPower / (1 - slip)
  const otherLoss = Math.max(powerFactor * (1 - efficiency) - slip * airgap, 1e-4)
  const lockedPowerFactor = plate.lockedRotorPowerFactor ?? 0.22
  const leakage = Math.sqrt(1 - lockedPowerFactor ** 2) / current
  const magnetising = Math.max(Math.sqrt(1 - powerFactor ** 2) - leakage, 0.1)
  const inner = (1.15 * slip) / airgap
  const lockedTorque = plate.lockedRotorTorque ?? lockedPowerFactor * current * 0.75
  const outer = Math.max((2 * lockedTorque) / current ** 2 / inner, 1.5)
  const values = [otherLoss / 2, leakage / 2, 1 / magnetising, 2 / otherLoss, inner, outer - 1, leakage / 2, 0.8]
  return Float64Array.from(values, (value, i) => clamp(Math.log(value), lowest[i]!, highest[i]!))
}
