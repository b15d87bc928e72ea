/**
 * Tolerances on declared values of cage motors, for named corners of a study; contract bounds, not distributions.
 * Source: IEC 60034-1, clause 12 (from memory; verify against the edition in force).
 */
export const declaredTolerance = {
  lockedRotorCurrent: { least: null, most: 1.2 },
  lockedRotorTorque: { least: 0.85, most: 1.25 },
  pullUpTorque: { least: 0.85, most: null },
  breakdownTorque: { least: 0.9, most: null },
  inertia: { least: 0.9, most: 1.1 },
} as const

/** Least efficiency that still meets a declared one: 15 % more losses per output up to 150 kW, 10 % above. Power in W. */
export const leastEfficiency = (declared: number, ratedPower: number): number =>
  declared - (ratedPower <= 150e3 ? 0.15 : 0.1) * (1 - declared)

/** Least power factor that still meets a declared one: a sixth of what lacks to 1, at least 0.02 and at most 0.07. */
export const leastPowerFactor = (declared: number): number =>
  declared - Math.min(0.07, Math.max(0.02, (1 - declared) / 6))

/** Slips that still meet a declared one: ± 20 % from 1 kW on, ± 30 % below. Power in W. */
export const slipRange = (declared: number, ratedPower: number): { least: number; most: number } => {
  const part = ratedPower >= 1e3 ? 0.2 : 0.3
  return { least: declared * (1 - part), most: declared * (1 + part) }
}
