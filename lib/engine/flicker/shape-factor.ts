/**
 * Time that one voltage change spoils, s: t_f = 2.3·(F·d_max)^3.2 with d_max in per cent.
 *
 * F is 1 for a step, which is the most for a start that recovers slowly; valid for changes at least a second apart.
 * Source: IEC 61000-3-3, analytical method.
 */
export const spoiledTime = (largestChange: number, shapeFactor = 1): number =>
  2.3 * (100 * shapeFactor * largestChange) ** 3.2

/** Severity of a number of equal changes in a period: (Σt_f/T)^(1/3.2); 600 s for the short term. */
export const severityOfChanges = (largestChange: number, count: number, period = 600): number =>
  ((count * spoiledTime(largestChange)) / period) ** (1 / 3.2)
