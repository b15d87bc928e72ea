import type { InductionCircuit } from '../case-input'
import { machineTable } from '../machines/machine-table'
import { bestFit } from './best-fit'
import { highest, looseness, lowest, plainGuess, toCircuit, type Unknowns, writeCircuit } from './circuit-unknowns'
import { dampedLeastSquares } from './damped-least-squares'
import { type Fit, fading, fitFrom } from './fit-circuit'
import { inPerUnit, type Nameplate, type PlateInPerUnit, plateBase } from './nameplate'
import { fitResiduals, stated } from './plate-mismatch'
import { refusePlate } from './plate-problems'
import { runUpFigures } from './run-up-figures'

/**
 * How the plain guess is put otherwise, as logarithms of the unknowns' factors, in the order of `unknownNames`: copper
 * against core losses, leakage in the stator against that in the rotor, cages that differ more and less in reactance.
 */
const otherGuesses: readonly (readonly number[])[] = [
  [1.1, 0, 0, 0.8, 0, 0, 0, 0],
  [-1.4, 0, 0, -0.5, 0, 0, 0, 0],
  [0, 0.6, 0, 0, 0, 0, -0.8, 0],
  [0, -0.9, 0, 0, 0, 0, 0.5, 0],
  [0, 0, 0, 0, 0, 0.4, -0.5, 1.6],
  [0, 0, 0, 0, 0, -0.4, 0.4, -1.6],
  [1.1, -0.9, 0, 0.8, 0, 0, 0.5, 0],
  [-1.4, -0.9, 0, -0.5, 0, 0, 0.5, 0],
]

/** Weights of a pull, from one that moves the circuit off its plate to one that the plate overcomes. */
const pulls = [0.3, 0.1, 0.03, 0.01, 0.003]
/** Strength of the prior beside a pull, in parts of it: keeps unknowns that change nothing where they were. */
const beside = 0.02
/** Figures pulled up and down: time without load, and least torque. */
const pulled = [0, 1] as const

/** Residual within which a circuit counts as meeting the plate. */
const meets = 1e-4

/** The circuit on the plate farthest in one direction of one figure: pulled there, then let back onto the plate. */
const extreme = (plate: PlateInPerUnit, best: Unknowns, figure: 0 | 1, direction: 1 | -1): Fit => {
  const table = machineTable([toCircuit(best, 1)])
  const wanted = stated(plate)
  const goal = runUpFigures(table)[figure] + direction
  let unknowns = best
  for (const weight of pulls) {
    const problem = {
      low: lowest,
      high: highest,
      leastGain: 1e-5,
      residuals: (x: Unknowns) => {
        writeCircuit(table.circuit, x)
        const all = fitResiduals(table, plate.slip, wanted)
        for (let i = 0; i < x.length; i++) all.push((beside * weight * (x[i]! - best[i]!)) / looseness[i]!)
        all.push(weight * (runUpFigures(table)[figure] - goal))
        return all
      },
    }
    unknowns = dampedLeastSquares(problem, unknowns).x
  }
  return fitFrom(plate, unknowns, [1e-5, 1e-7], unknowns)
}

/** The members at either end of each figure, each once, without those that are no farther out than the best circuit. */
const ends = (members: readonly Fit[], best: Fit): readonly Fit[] => {
  const figures = [best, ...members].map(({ unknowns }) => runUpFigures(machineTable([toCircuit(unknowns, 1)])))
  const kept = new Set<number>()
  for (let k = 0; k < 3; k++) {
    const values = figures.map((each) => each[k]!)
    kept.add(values.indexOf(Math.min(...values)))
    kept.add(values.indexOf(Math.max(...values)))
  }
  return members.filter((_, i) => kept.has(i + 1))
}

/**
 * Circuits that meet one plate as well as the estimated one and differ from it as far as the plate leaves open: those at
 * either end of run-up time, least torque and locked-rotor power factor, six at most. Star, ohm per phase. Deterministic.
 *
 * Found by other guesses and by pulling time and least torque up and down along the plate. A circuit counts that misses
 * no quantity by more than 1e-4, or, where no circuit meets the plate, that is as near as the best one to a twentieth.
 * A plate that fixes everything gives none; so does one that is refused.
 */
export const circuitsOnPlate = (plate: Nameplate): readonly InductionCircuit[] => {
  if (refusePlate(plate)) return []
  const base = plateBase(plate)
  const perUnit = inPerUnit(plate, base)
  const plain = plainGuess(perUnit)
  const best = bestFit(perUnit)
  const near = Math.max(meets, 1.05 * best.largest)
  const others = otherGuesses.map((shift) => {
    const guess: Unknowns = plain.map((value, i) => Math.min(highest[i]!, Math.max(lowest[i]!, value + shift[i]!)))
    return fitFrom(perUnit, guess, fading, guess)
  })
  const extremes = pulled.flatMap((figure) => [
    extreme(perUnit, best.unknowns, figure, 1),
    extreme(perUnit, best.unknowns, figure, -1),
  ])
  const members = [...others, ...extremes].filter(({ largest }) => largest <= near)
  return ends(members, best).map(({ unknowns }) => toCircuit(unknowns, base.impedance))
}
