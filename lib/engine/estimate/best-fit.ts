import { highest, lowest, plainGuess } from './circuit-unknowns'
import { type Fit, fading, fitFrom } from './fit-circuit'
import type { PlateInPerUnit } from './nameplate'

/** Residual at which a start is good enough that no other one is tried. */
const goodEnough = 1e-5

/** Where the search begins beside the plain guess: shifts of the unknowns, as logarithms. */
const otherStarts: readonly (readonly number[])[] = [
  [0.7, 0, 0, 0.7, -0.4, 0.8, 0, 0.8],
  [-0.7, 0.4, 0, -0.4, 0.3, -0.8, -0.4, -0.8],
  [0, -0.6, 0.5, 0, -0.2, 1.4, 0.5, 0],
  [-1.2, 0.5, -0.3, 0, 0, 0.5, -0.8, 1.5],
  [0.4, -0.9, 0.2, 1.2, 0.2, 0, 0.7, -1.5],
  [1.1, 0.3, 0, 1.6, -0.3, 2, -0.9, 1.2],
  [-1.8, 0, 0, -0.8, 0.1, -1.5, 0.2, 0.4],
]

/** Of two circuits that meet the plate neither is better; else the one with less of what the fit minimises. */
const isBetter = (one: Fit, other: Fit): boolean =>
  one.largest <= goodEnough ? other.largest > goodEnough : one.cost < other.cost

/** Weights with which a fit that stuck short of the plate is taken up again, pulled at nothing but where it stands. */
const faint = [1e-4, 1e-6, 1e-8]
const mostRounds = 6
/** Below this largest residual a plate is within reach: only the way there was slow. */
const withinReach = 0.02

/** Takes up a fit that came near the plate and got stuck in a flat valley, until it meets it or gains no more. */
const polished = (plate: PlateInPerUnit, found: Fit): Fit => {
  let best = found
  for (let round = 0; round < mostRounds && best.largest > goodEnough && best.largest < withinReach; round++) {
    const next = fitFrom(plate, best.unknowns, faint, best.unknowns)
    if (!(next.cost < 0.99 * best.cost)) break
    best = next
  }
  return best
}

/** The circuit nearest to the plain guess that meets the plate, else the one with the least sum of squares of all starts. */
export const bestFit = (plate: PlateInPerUnit): Fit => {
  const guess = plainGuess(plate)
  let best = fitFrom(plate, guess, fading, guess)
  for (const shift of otherStarts) {
    if (best.largest <= goodEnough) break
    const start = guess.map((value, i) => Math.min(highest[i]!, Math.max(lowest[i]!, value + shift[i]!)))
    const other = fitFrom(plate, start, fading.slice(3), guess)
    if (isBetter(other, best)) best = other
  }
  return polished(plate, best)
}
