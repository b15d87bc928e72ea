import type { InductionCircuit } from '../case-input'
import { bestFit } from './best-fit'
import { highest, lowest, toCircuit, type UnknownName, unknownNames } from './circuit-unknowns'
import type { Fit } from './fit-circuit'
import { inPerUnit, type Nameplate, plateBase } from './nameplate'
import { type PlateQuantity, stated } from './plate-mismatch'
import { type PlateContradiction, type PlateRefusal, plateContradictions, refusePlate } from './plate-problems'

/** How far the circuit is from one quantity of the plate: figure over plate minus one. */
export interface PlateResidual {
  quantity: PlateQuantity
  residual: number
}

export type EstimateFlag =
  /** The circuit misses this quantity by more than a part in a thousand: the plate cannot be met by one motor. */
  | { kind: 'not-met'; quantity: PlateQuantity; residual: number }
  /** This parameter lies at the edge of what motors have. */
  | { kind: 'at-edge'; parameter: UnknownName }

export type EstimateOutcome =
  | {
      kind: 'estimated'
      /** Star, ohm per phase, rotor referred to the stator. */
      circuit: InductionCircuit
      residuals: readonly PlateResidual[]
      /** Largest size among the residuals. */
      largestResidual: number
      flags: readonly EstimateFlag[]
      contradictions: readonly PlateContradiction[]
    }
  | { kind: 'refused'; cause: PlateRefusal; detail: string }

const flagsOf = (found: Fit, residuals: readonly PlateResidual[]): readonly EstimateFlag[] => [
  ...residuals
    .filter(({ residual }) => Math.abs(residual) > 1e-3)
    .map(({ quantity, residual }) => ({ kind: 'not-met' as const, quantity, residual })),
  ...unknownNames.flatMap((parameter, i) => {
    const value = found.unknowns[i]!
    const atEdge = value <= lowest[i]! + 1e-9 || value >= highest[i]! - 1e-9
    return atEdge ? [{ kind: 'at-edge' as const, parameter }] : []
  }),
]

/**
 * The plainest double-cage circuit that has a plate's shaft power, power factor, efficiency, locked-rotor current and,
 * where given, locked-rotor torque, breakdown torque and locked-rotor power factor.
 *
 * Eight unknowns in logarithms, per unit on P/(η·cos φ), in a box of plausible values; damped least squares with priors
 * that fade, so that among all circuits that meet the plate the one nearest to the plain guess is taken. Friction and
 * stray losses lie in the core resistance. Valid for cage motors of about 11 kW to 15 MW. A plate does not fix the
 * run-up: circuits that meet the same plate differ by a fifth in run-up time (`circuitsOnPlate`).
 *
 * A plate that no constant circuit can have gives the one with the least sum of squares, its residuals and flags. Small
 * motors from catalogues are often of this kind: their locked-rotor current asks for less leakage than their breakdown
 * torque, which is what saturation of the leakage paths does and constant parameters cannot.
 * Refused, with the reason, where no circuit can have such a plate (efficiency at or above 1 − slip, for example).
 */
export const estimateCircuit = (plate: Nameplate): EstimateOutcome => {
  const refusal = refusePlate(plate)
  if (refusal) return { kind: 'refused', ...refusal }
  const base = plateBase(plate)
  const perUnit = inPerUnit(plate, base)
  const found = bestFit(perUnit)
  const residuals = stated(perUnit).map(([quantity], i) => ({ quantity, residual: found.residuals[i]! }))
  return {
    kind: 'estimated',
    circuit: toCircuit(found.unknowns, base.impedance),
    residuals,
    largestResidual: found.largest,
    flags: flagsOf(found, residuals),
    contradictions: plateContradictions(plate),
  }
}
