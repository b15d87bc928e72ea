import type { InductionCircuit } from '../case-input'
import { highest, lowest, plainGuess, toCircuit, type Unknowns } from './circuit-unknowns'
import { fading, fitFrom } from './fit-circuit'
import { inPerUnit, type Nameplate, plateBase } from './nameplate'
import { refusePlate } from './plate-problems'

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

/** Residual within which a circuit counts as meeting the plate like the best one. */
const meets = 1e-4

/**
 * Circuits that meet one plate as well as the estimated one and differ from it as far as the plate leaves open.
 *
 * Each is the circuit nearest to another guess; those that miss the plate by more than 1e-4 in any quantity are left
 * out, so a plate that fixes everything, or that no motor can have, gives none. Star, ohm per phase. Deterministic.
 */
export const circuitsOnPlate = (plate: Nameplate): readonly InductionCircuit[] => {
  if (refusePlate(plate)) return []
  const base = plateBase(plate)
  const perUnit = inPerUnit(plate, base)
  const plain = plainGuess(perUnit)
  return otherGuesses.flatMap((shift) => {
    const guess: Unknowns = plain.map((value, i) => Math.min(highest[i]!, Math.max(lowest[i]!, value + shift[i]!)))
    const { unknowns, largest } = fitFrom(perUnit, guess, fading, guess)
    return largest <= meets ? [toCircuit(unknowns, base.impedance)] : []
  })
}
