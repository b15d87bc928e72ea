/** A curve as points with straight lines between, and how far the lines lie from it at most where that was looked at. */
export interface SampledCurve {
  at: number[]
  values: number[]
  /** Largest departure at the middles of the lines, in parts of the largest value. */
  departure: number
}

/** Departure that the points are set for, in parts of the largest value, and how many points that may take. */
const wanted = 1e-4
const first = 17
const most = 200

/**
 * Samples a function between two ends: seventeen even points, then the middle of the line that lies farthest from the
 * function, again and again, until no middle departs by more than a ten-thousandth of the largest value.
 *
 * @returns null where the function has no finite value
 */
export function sampleCurve(of: (at: number) => number, from: number, to: number): SampledCurve | null {
  const points = Array.from({ length: first }, (_, i) => {
    const at = from + ((to - from) * i) / (first - 1)
    return { at, value: of(at) }
  })
  const middle = (i: number) => {
    const at = (points[i]!.at + points[i + 1]!.at) / 2
    const value = of(at)
    return { at, value, off: Math.abs(value - (points[i]!.value + points[i + 1]!.value) / 2) }
  }
  const middles = Array.from({ length: first - 1 }, (_, i) => middle(i))
  const finite = (): boolean => [...points, ...middles].every(({ value }) => Number.isFinite(value))
  if (!finite()) return null
  const largest = (): number => Math.max(...points.map(({ value }) => Math.abs(value)), Number.MIN_VALUE)
  for (;;) {
    const off = Math.max(...middles.map((each) => each.off))
    if (off <= wanted * largest() || points.length >= most) {
      return {
        at: points.map(({ at }) => at),
        values: points.map(({ value }) => value),
        departure: off / largest(),
      }
    }
    const worst = middles.findIndex((each) => each.off === off)
    const { at, value } = middles[worst]!
    points.splice(worst + 1, 0, { at, value })
    middles.splice(worst, 1, middle(worst), middle(worst + 1))
    if (!Number.isFinite(middles[worst]!.value + middles[worst + 1]!.value)) return null
  }
}
