import { machineTable } from '../machines/machine-table'
import { highest, looseness, lowest, toCircuit, type Unknowns, writeCircuit } from './circuit-unknowns'
import { dampedLeastSquares } from './damped-least-squares'
import type { PlateInPerUnit } from './nameplate'
import { fitResiduals, relativeMismatch, stated, tableFigures } from './plate-mismatch'

/** Weights of the priors, from a firm hand to one that only picks among equals. */
export const fading = [0.1, 0.03, 0.01, 3e-3, 1e-3, 1e-4, 1e-5, 1e-6]

/** A circuit fitted to a plate. */
export interface Fit {
  unknowns: Unknowns
  residuals: readonly number[]
  largest: number
  /** Sum of squares of what the fit drives to zero, without the priors: what ranks circuits that miss the plate. */
  cost: number
}

/** Part of the cost that a step must gain to be followed by another: less where the weight fades further anyway. */
const gainOnTheWay = 1e-5
const gainAtTheEnd = 1e-9

/**
 * Fits a circuit to a plate from a start, with priors towards a guess whose weights follow one after the other.
 *
 * @param guess what the priors pull at: among circuits that meet the plate alike the one nearest to it is found
 */
export const fitFrom = (plate: PlateInPerUnit, start: Unknowns, weights: readonly number[], guess: Unknowns): Fit => {
  const wanted = stated(plate)
  const table = machineTable([toCircuit(start, 1)])
  const gap = (x: Unknowns): number[] => {
    writeCircuit(table.circuit, x)
    return fitResiduals(table, plate.slip, wanted)
  }
  let unknowns = start
  weights.forEach((weight, stage) => {
    const problem = {
      low: lowest,
      high: highest,
      leastGain: stage === weights.length - 1 ? gainAtTheEnd : gainOnTheWay,
      residuals: (x: Unknowns) => {
        const all = gap(x)
        for (let i = 0; i < x.length; i++) all.push((weight * (x[i]! - guess[i]!)) / looseness[i]!)
        return all
      },
    }
    unknowns = dampedLeastSquares(problem, unknowns).x
  })
  const cost = gap(unknowns).reduce((sum, value) => sum + value * value, 0)
  const residuals = relativeMismatch(tableFigures(table, plate.slip).figures, wanted)
  return { unknowns, residuals, largest: Math.max(...residuals.map(Math.abs)), cost }
}
