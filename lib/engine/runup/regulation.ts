/** Estimates of bus voltages for devices that look at them, one a motor. */
export interface Regulation {
  /** Forgets what the last search learned. */
  begin(): void
  /** Next estimate for motor i after the network answered `found` to devices that were told `told`. */
  next(i: number, told: number, found: number): number
}

/**
 * Secant step of each device by itself: with the answer's slope s from the last two rounds, told + (found − told)/(1 − s).
 * Without a slope the answer is the next estimate. A slope near 1 is that of a network about to collapse.
 */
export function createRegulation(count: number): Regulation {
  const toldBefore = new Float64Array(count)
  const foundBefore = new Float64Array(count)
  return {
    begin() {
      toldBefore.fill(Number.NaN)
    },
    next(i, told, found) {
      const slope = (found - foundBefore[i]!) / (told - toldBefore[i]!)
      toldBefore[i] = told
      foundBefore[i] = found
      if (!(slope > -9 && slope < 0.95)) return found
      return Math.max(found / 4, told + (found - told) / (1 - slope))
    },
  }
}
