/** A curve as two arrays of equal length. */
export interface Curve {
  x: readonly number[]
  y: readonly number[]
}

/**
 * The curve with no more points than the eye can see: of each column of `width` (in the unit of x) the first, the least,
 * the largest and the last point stay, in their order, so that no dip is lost. x must not fall.
 */
export const decimate = (curve: Curve, width: number): Curve => {
  const kept: number[] = []
  const { x, y } = curve
  let from = 0
  while (from < x.length) {
    const column = Math.floor(x[from]! / width)
    let to = from
    let least = from
    let largest = from
    while (to + 1 < x.length && Math.floor(x[to + 1]! / width) === column) {
      to += 1
      if (y[to]! < y[least]!) least = to
      if (y[to]! > y[largest]!) largest = to
    }
    const chosen = new Set([from, Math.min(least, largest), Math.max(least, largest), to])
    kept.push(...chosen)
    from = to + 1
  }
  return { x: kept.map((i) => x[i]!), y: kept.map((i) => y[i]!) }
}
