import { highest, looseness, lowest, toCircuit, type Unknowns } from './circuit-unknowns'
import { dampedLeastSquares } from './damped-least-squares'
import type { PlateInPerUnit } from './nameplate'
import { fitResiduals, plateFigures, relativeMismatch, stated } from './plate-mismatch'

/** Weights of the priors, from a firm hand to one that only picks among equals. */
export const fading = [0.1, 0.03, 0.01, 3e-3, 1e-3, 1e-4, 1e-5, 1e-6]

/** A circuit fitted to a plate. */
export interface Fit {
  unknowns: Unknowns
  residuals: readonly number[]
  largest: number
}

/**
 * Fits a circuit to a plate from a start, with priors towards a guess whose weights follow one after the other.
 *
 * @param guess what the priors pull at: among circuits that meet the plate alike the one nearest to it is found
 */
export const fitFrom = (plate: PlateInPerUnit, start: Unknowns, weights: readonly number[], guess: Unknowns): Fit => {
  const wanted = stated(plate)
  let unknowns = start
  for (const weight of weights) {
    const problem = {
      low: lowest,
      high: highest,
      residuals: (x: Unknowns) => [
        ...fitResiduals(toCircuit(x, 1), plate.slip, wanted),
        ...Array.from(x, (value, i) => (weight * (value - guess[i]!)) / looseness[i]!),
      ],
    }
    unknowns = dampedLeastSquares(problem, unknowns).x
  }
  const { figures } = plateFigures(toCircuit(unknowns, 1), plate.slip)
  const residuals = relativeMismatch(figures, wanted)
  return { unknowns, residuals, largest: Math.max(...residuals.map(Math.abs)) }
}
