import type { ReducedNetwork } from './reduce'

/** Frequencies in parts of rated between which a network is known; beyond them a set no longer feeds a plant. */
export const lowestFrequency = 0.6
export const highestFrequency = 1.2
const points = 10

/** A reduced network at any frequency within the grid. */
export interface FrequencyGrid {
  /** Writes admittance and source for a frequency into the network that solvers work on; false beyond the grid. */
  write(part: number, into: ReducedNetwork): boolean
  /** Writes the recovery for the frequency of the last `write`. */
  writeRecovery(into: ReducedNetwork): void
}

/**
 * Reduces a network at Chebyshev points of frequency and runs a polynomial through f·A, f·s and the recovery between
 * them (barycentric form); at rated frequency it is the reduction itself. Nothing is allocated while writing.
 *
 * Reactances are analytic in f and far from resonance at the fundamental, so ten points are good to about 1e-8.
 * Source: interpolation in Chebyshev points, any textbook on numerical analysis.
 *
 * @returns null where the network is singular at some frequency
 */
export function createFrequencyGrid(reduceAt: (part: number) => ReducedNetwork | null): FrequencyGrid | null {
  const rated = reduceAt(1)
  if (rated === null) return null
  const middle = (lowestFrequency + highestFrequency) / 2
  const half = (highestFrequency - lowestFrequency) / 2
  const angle = (j: number): number => ((2 * j + 1) * Math.PI) / (2 * points)
  const at = Float64Array.from({ length: points }, (_, j) => middle + half * Math.cos(angle(j)))
  const weight = Float64Array.from({ length: points }, (_, j) => (j % 2 === 0 ? 1 : -1) * Math.sin(angle(j)))
  const known: ReducedNetwork[] = []
  for (const part of at) {
    const network = reduceAt(part)
    if (network === null) return null
    known.push(network)
  }
  const share = new Float64Array(points)
  let last = 1

  function findShares(part: number): void {
    let sum = 0
    for (let j = 0; j < points; j++) {
      const away = part - at[j]!
      share[j] = weight[j]! / (away === 0 ? 1e-300 : away)
      sum += share[j]!
    }
    for (let j = 0; j < points; j++) share[j] = share[j]! / sum
  }

  function blend(which: 'admittance' | 'source' | 'recovery', part: number, into: Float64Array): void {
    into.fill(0)
    for (let j = 0; j < points; j++) {
      const from = known[j]![which]
      const scale = which === 'recovery' ? share[j]! : (share[j]! * at[j]!) / part
      for (let i = 0; i < into.length; i++) into[i] = into[i]! + scale * from[i]!
    }
  }

  return {
    write(part, into) {
      if (!(part >= lowestFrequency && part <= highestFrequency)) return false
      last = part
      if (part === 1) {
        into.admittance.set(rated.admittance)
        into.source.set(rated.source)
        return true
      }
      findShares(part)
      blend('admittance', part, into.admittance)
      blend('source', part, into.source)
      return true
    },
    writeRecovery(into) {
      if (last === 1) into.recovery.set(rated.recovery)
      else blend('recovery', last, into.recovery)
    },
  }
}
