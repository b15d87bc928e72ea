import { type Second, second } from '../../units/si'

/** Shapes of inverse-time elements: t = m·(A/(M^P − 1) + B), M the current in parts of the setting. */
export const inverseCurves = {
  'normal-inverse': { a: 0.14, b: 0, p: 0.02 },
  'very-inverse': { a: 13.5, b: 0, p: 1 },
  'extremely-inverse': { a: 80, b: 0, p: 2 },
  'short-time-inverse': { a: 0.05, b: 0, p: 0.04 },
  'long-time-inverse': { a: 120, b: 0, p: 1 },
  'moderately-inverse-us': { a: 0.0515, b: 0.114, p: 0.02 },
  'very-inverse-us': { a: 19.61, b: 0.491, p: 2 },
  'extremely-inverse-us': { a: 28.2, b: 0.1217, p: 2 },
} as const

export type InverseCurve = keyof typeof inverseCurves

/**
 * Operating time of an inverse element at a steady current.
 *
 * Source: IEC 60255-151 (the first five), IEEE C37.112 (the last three).
 *
 * @param multiple current in parts of the setting
 * @param multiplier time multiplier (TMS) or time dial
 * @returns null at or below the setting: the element does not operate
 */
export function inverseTime(curve: InverseCurve, multiple: number, multiplier = 1): Second | null {
  if (!(multiple > 1)) return null
  const { a, b, p } = inverseCurves[curve]
  return second(multiplier * (a / (multiple ** p - 1) + b))
}

/**
 * When an inverse element operates on a current that changes: at ∫dt/t(I) = 1.
 *
 * Below the setting the element stands still; its reset is left out, which is on the safe side of a start. Between
 * points the current runs straight and each step takes the mean of the rates at its ends.
 * Source: IEEE C37.112, dynamic characteristic.
 *
 * @param times rising, s
 * @param multiples current in parts of the setting at these times
 * @returns null where it does not operate within the record
 */
export function operatesAt(
  timeOf: (multiple: number) => number | null,
  times: readonly number[],
  multiples: readonly number[],
): Second | null {
  const rate = (multiple: number): number => {
    const time = timeOf(multiple)
    return time === null ? 0 : 1 / time
  }
  let travelled = 0
  for (let k = 0; k + 1 < times.length; k++) {
    const step = times[k + 1]! - times[k]!
    const [from, to] = [rate(multiples[k]!), rate(multiples[k + 1]!)]
    const gain = (step * (from + to)) / 2
    if (travelled + gain < 1) {
      travelled += gain
      continue
    }
    // Rate runs straight in time within the step: from·τ + (to − from)·τ²/(2·step) = what is left.
    const left = 1 - travelled
    const slope = (to - from) / step
    const into =
      Math.abs(slope) * step < 1e-12 * from ? left / from : (Math.sqrt(from ** 2 + 2 * slope * left) - from) / slope
    return second(times[k]! + into)
  }
  return null
}
