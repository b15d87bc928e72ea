import { scaleLinear } from 'd3-scale'

/** A domain with round ends around the values, with a little air; `include` names values that must be in it. */
export const domainAround = (
  values: Iterable<number>,
  include: readonly number[] = [],
  air = 0.05,
): readonly [number, number] => {
  let low = Number.POSITIVE_INFINITY
  let high = Number.NEGATIVE_INFINITY
  for (const value of [...values, ...include]) {
    if (!Number.isFinite(value)) continue
    low = Math.min(low, value)
    high = Math.max(high, value)
  }
  if (low > high) return [0, 1]
  const margin = air * (high - low || Math.abs(high) || 1)
  const [from, to] = scaleLinear([low - margin, high + margin], [0, 1])
    .nice(10)
    .domain()
  // Air below a quantity that starts at zero would only raise the curve off its axis.
  return [low >= 0 && from! < 0 ? 0 : from!, to!]
}
