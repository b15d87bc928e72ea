/** y at any x within the points; allocates nothing. */
export type Interpolant = (x: number) => number

/** Slopes of the cubic that keeps to the points' rises and falls (Fritsch and Carlson 1980, harmonic mean of Fritsch and Butland 1984). */
function monotoneSlopes(x: readonly number[], y: readonly number[]): Float64Array {
  const n = x.length
  const slopes = new Float64Array(n)
  const secant = (k: number): number => (y[k + 1]! - y[k]!) / (x[k + 1]! - x[k]!)
  const atEnd = (near: number, far: number, h0: number, h1: number): number => {
    const slope = ((2 * h0 + h1) * near - h0 * far) / (h0 + h1)
    if (slope * near <= 0) return 0
    return near * far <= 0 && Math.abs(slope) > 3 * Math.abs(near) ? 3 * near : slope
  }
  if (n === 2) return slopes.fill(secant(0))
  for (let k = 1; k < n - 1; k++) {
    const [before, after] = [secant(k - 1), secant(k)]
    if (before * after <= 0) continue
    const [h0, h1] = [x[k]! - x[k - 1]!, x[k + 1]! - x[k]!]
    const [w0, w1] = [2 * h1 + h0, h1 + 2 * h0]
    slopes[k] = (w0 + w1) / (w0 / before + w1 / after)
  }
  slopes[0] = atEnd(secant(0), secant(1), x[1]! - x[0]!, x[2]! - x[1]!)
  slopes[n - 1] = atEnd(secant(n - 2), secant(n - 3), x[n - 1]! - x[n - 2]!, x[n - 2]! - x[n - 3]!)
  return slopes
}

/**
 * A curve through points of rising x, straight between them or as a monotone cubic.
 *
 * Outside the points it holds its end value: whoever must not go there looks first. Needs two points or more.
 */
export function interpolant(
  x: readonly number[],
  y: readonly number[],
  kind: 'linear' | 'monotone' = 'linear',
): Interpolant {
  const n = x.length
  const slopes = kind === 'monotone' ? monotoneSlopes(x, y) : null
  let k = 0
  return (at) => {
    if (at <= x[0]!) return y[0]!
    if (at >= x[n - 1]!) return y[n - 1]!
    while (k > 0 && at < x[k]!) k--
    while (at >= x[k + 1]!) k++
    const h = x[k + 1]! - x[k]!
    const t = (at - x[k]!) / h
    if (slopes === null) return y[k]! + t * (y[k + 1]! - y[k]!)
    const [one, two] = [1 - t, t * t]
    return (
      y[k]! * (1 + 2 * t) * one * one +
      h * slopes[k]! * t * one * one +
      y[k + 1]! * two * (3 - 2 * t) -
      h * slopes[k + 1]! * two * one
    )
  }
}
