/** Who limits the number of starts. */
export type StartsSource = 'maker' | 'device' | 'utility' | 'process' | 'heat'

export interface StartsAllowed {
  /** Starts an hour; null where nobody but the heat balance says anything. */
  perHour: number | null
  /** What the least comes from; several where they agree. */
  governing: readonly StartsSource[]
  /** Sources without a number: what is allowed can only be less. */
  unknown: readonly StartsSource[]
}

/**
 * Starts an hour that are allowed: the least of what the maker of the motor, the starting device, the utility's class of
 * starts and the process allow. The heat balance lowers that number and never stands for a missing one.
 *
 * @param sources number an hour by source; null where it states none, left out where it does not apply
 */
export function startsAllowed(sources: Partial<Record<StartsSource, number | null>>): StartsAllowed {
  const stated = Object.entries(sources) as [StartsSource, number | null][]
  const known = stated.flatMap(([source, value]) => (value === null ? [] : [{ source, value }]))
  const unknown = stated.flatMap(([source, value]) => (value === null ? [source] : []))
  if (!known.some(({ source }) => source !== 'heat')) return { perHour: null, governing: [], unknown }
  const perHour = Math.min(...known.map(({ value }) => value))
  return { perHour, governing: known.filter(({ value }) => value === perHour).map(({ source }) => source), unknown }
}
