import type { InductionCircuit } from '@/lib/engine/case-input'
import { ohm } from '@/lib/units/si'

/** Far above every other reactance: a magnetising branch that is left out. */
export const noMagnetising = 1e9

/** Single-cage star circuit in ohm; a core resistance of null leaves the core loss out. */
export const singleCage = (
  r1: number,
  x1: number,
  xm: number,
  r2: number,
  x2: number,
  core: number | null = null,
): InductionCircuit => ({
  stator: { re: ohm(r1), im: ohm(x1) },
  magnetising: ohm(xm),
  core: core === null ? null : ohm(core),
  cages: [{ resistance: ohm(r2), reactance: ohm(x2) }],
})
