import { type Complex, type Ohm, ohm, type Volt, type VoltAmpere, voltAmpere } from '../../units/si'
import type { CaseInput } from '../case-input'
import type { CaseResult } from '../case-result'
import { findRoot } from '../numeric/root'
import { runCase } from '../run-case'

/** The level at which a change just reaches a limit, or why there is none. */
export type BreakevenLevel =
  | {
      kind: 'found'
      /** Short-circuit level at the voltage it is stated at, VA. */
      level: VoltAmpere
      /** Open-circuit voltage of the supply at that level, V. */
      emf: Volt
      /** Runs of the whole case that it took. */
      runs: number
    }
  /** The limit holds at every level looked at, down to the least. */
  | { kind: 'always'; downTo: VoltAmpere }
  /** It holds at none, up to the greatest. */
  | { kind: 'never'; upTo: VoltAmpere }

export interface BreakevenQuestion {
  /** Bus whose deepest change of the voltage before the start is asked for. */
  busId: string
  /** Change in parts of the voltage before the start. */
  change: number
  /** Voltage that the level is stated at, V. */
  statedAt: Volt
  /** Levels between which is looked, VA. */
  least: VoltAmpere
  most: VoltAmpere
}

const impedanceOf = (level: number, statedAt: Volt, angle: Complex<Ohm>): Complex<Ohm> => {
  const size = statedAt ** 2 / level
  const was = Math.hypot(angle.re, angle.im)
  return { re: ohm((angle.re / was) * size), im: ohm((angle.im / was) * size) }
}

const changeAt = (result: CaseResult, busId: string): number | null => {
  if (result.outcome.kind !== 'complete') return null
  const place = result.places.find((each) => each.busId === busId)
  return place ? 1 - place.deepest.voltage / place.before : null
}

/** Levels tried between the ends, evenly by ratio, before a bracket is narrowed. */
const looks = 12
/** Width of the bracket at the end, in parts of the level. */
const width = 1e-9

/**
 * Least short-circuit level at which the deepest change at a bus keeps within a limit, over the whole run.
 *
 * X/R and the voltage before the start (or the open-circuit voltage, where that is given) are held, the EMF solved anew
 * at every level. Levels are tried from the strongest down; the crossing nearest to it is the one that is found, and a
 * level at which the case has no solution counts as beyond the limit. Source: bracketed search over the full model.
 */
export function breakevenLevel(input: CaseInput, question: BreakevenQuestion): BreakevenLevel {
  const { busId, change, statedAt, least, most } = question
  let runs = 0
  const runAt = (level: number): CaseResult => {
    runs++
    const impedance = impedanceOf(level, statedAt, input.supply.impedance)
    return runCase({ ...input, supply: { ...input.supply, impedance } })
  }
  // No solution is worse than any change.
  const excess = (level: number): number => (changeAt(runAt(level), busId) ?? 1) - change
  const step = (least / most) ** (1 / looks)
  let inside: number = most
  let margin = excess(inside)
  if (margin > 0) return { kind: 'never', upTo: most }
  for (let k = 1; k <= looks; k++) {
    const next = most * step ** k
    const there = excess(next)
    if (there > 0) {
      const level = findRoot(excess, next, inside, width * inside, there, margin)
      const { supply } = runAt(level)
      if (supply === null) throw new RangeError('the case lost its supply at the level that was found')
      return { kind: 'found', level: voltAmpere(level), emf: supply.emf, runs }
    }
    inside = next
    margin = there
  }
  return { kind: 'always', downTo: least }
}

/**
 * Level at which an impedance alone on a supply's bus takes a given change, V·A: closed form.
 *
 * |Z_s|² + 2|Z_s| Re(Z_m e^{−jθ}) + |Z_m|²(1 − 1/(1 − d)²) = 0, S_k = U²/|Z_s|.
 *
 * @param load impedance that is switched on, ohm per phase
 * @param angle angle of the supply's impedance, rad
 * @param change change in parts of the voltage before, between 0 and 1
 */
export function levelForOneImpedance(load: Complex<Ohm>, angle: number, change: number, voltage: Volt): VoltAmpere {
  const projected = load.re * Math.cos(angle) + load.im * Math.sin(angle)
  const square = load.re ** 2 + load.im ** 2
  const size = -projected + Math.sqrt(projected ** 2 - square * (1 - 1 / (1 - change) ** 2))
  return voltAmpere(voltage ** 2 / size)
}
