import type { InductionCircuit } from '../case-input'

/** What the skin effect makes of the inner cage at a slip. */
export interface DeepBarLaw {
  /** Ohm to add to the resistance at synchronous speed. */
  addedResistance(slip: number): number
  /** Reactance, ohm. */
  reactance(slip: number): number
}

/** Below this reduced depth the closed forms lose digits and their series to the fourth power is exact to round-off. */
const shallow = 0.02

/** Factor on the resistance of a rectangular bar of reduced depth ξ: ξ(sinh 2ξ + sin 2ξ)/(cosh 2ξ − cos 2ξ). */
export function barResistanceFactor(depth: number): number {
  if (depth < shallow) return 1 + (4 / 45) * depth ** 4
  const d = 2 * depth
  return (depth * (Math.sinh(d) + Math.sin(d))) / (Math.cosh(d) - Math.cos(d))
}

/** Factor on the slot reactance of such a bar: (3/2ξ)(sinh 2ξ − sin 2ξ)/(cosh 2ξ − cos 2ξ). */
export function barReactanceFactor(depth: number): number {
  if (depth < shallow) return 1 - (8 / 315) * depth ** 4
  const d = 2 * depth
  return (3 * (Math.sinh(d) - Math.sin(d))) / (2 * depth * (Math.cosh(d) - Math.cos(d)))
}

/**
 * Resistance and reactance of a deep-bar cage against slip, null for a circuit without skin effect.
 *
 * Linear law: from the values at synchronous speed to those at |s| = 1, held beyond. Bar law: reduced depth
 * ξ = ξ₁·√|s| (rotor frequency |s|·f), resistance times k_R(ξ), the slot's part of the reactance times k_X(ξ).
 * Source: the classical solution for a conductor in a slot, in any textbook on machine design; common practice.
 */
export function deepBarLaw({ cages, deepBar }: InductionCircuit): DeepBarLaw | null {
  if (!deepBar) return null
  const { resistance, reactance } = cages[0]!
  if (deepBar.law === 'linear') {
    const [moreR, moreX] = [deepBar.resistance - resistance, deepBar.reactance - reactance]
    return {
      addedResistance: (slip) => moreR * Math.min(1, Math.abs(slip)),
      reactance: (slip) => reactance + moreX * Math.min(1, Math.abs(slip)),
    }
  }
  const { depth, slotShare } = deepBar
  return {
    addedResistance: (slip) => resistance * (barResistanceFactor(depth * Math.sqrt(Math.abs(slip))) - 1),
    reactance: (slip) =>
      reactance * (1 - slotShare + slotShare * barReactanceFactor(depth * Math.sqrt(Math.abs(slip)))),
  }
}
