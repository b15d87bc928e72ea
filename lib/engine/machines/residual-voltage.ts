import { isTabulated, type MachineModel } from '../case-input'

/** Residual voltage, in parts of rated, below which closing on it counts as closing on a motor without flux (common practice, no source). */
export const harmlessResidual = 0.25

/**
 * Time in s after which a motor that was cut off at rated voltage and still turns has lost its residual voltage but for
 * `harmlessResidual`: T₀·ln(1/0.25), T₀ the slowest open-circuit time constant of its rotor. Null for a machine known by
 * its curves. The speed counts as kept; slowing down makes the voltage fall faster. Several motors and capacitors left
 * together on a bus hold it longer.
 *
 * One cage: T₀ = (X_r + X_m)/(ω_b·R_r). Two cages: the larger root of the two coupled circuits. Source: textbooks on the
 * analysis of electric machinery.
 *
 * @param frequency Hz
 */
export function residualDecayTime(model: MachineModel, frequency: number): number | null {
  if (isTabulated(model)) return null
  const base = 2 * Math.PI * frequency
  const [inner, outer] = model.cages
  const own = (cage: { resistance: number; reactance: number }) =>
    (cage.reactance + model.magnetising) / cage.resistance
  if (!outer) return (Math.log(1 / harmlessResidual) * own(inner!)) / base
  // T² − (T₁ + T₂)·T + T₁T₂ − X_m²/(R₁R₂) = 0
  const [first, second] = [own(inner!), own(outer)]
  const sum = first + second
  const product = first * second - model.magnetising ** 2 / (inner!.resistance * outer.resistance)
  const slowest = (sum + Math.sqrt(Math.max(0, sum * sum - 4 * product))) / 2
  return (Math.log(1 / harmlessResidual) * slowest) / base
}
