import { type Second, second } from '../../units/si'

/** Shapes of inverse-time elements: t = m·(A/(M^P − 1) + B), M the current in parts of the setting; reset m·t_r/(1 − M²). */
export const inverseCurves = {
  'normal-inverse': { a: 0.14, b: 0, p: 0.02, reset: 0 },
  'very-inverse': { a: 13.5, b: 0, p: 1, reset: 0 },
  'extremely-inverse': { a: 80, b: 0, p: 2, reset: 0 },
  'short-time-inverse': { a: 0.05, b: 0, p: 0.04, reset: 0 },
  'long-time-inverse': { a: 120, b: 0, p: 1, reset: 0 },
  'moderately-inverse-us': { a: 0.0515, b: 0.114, p: 0.02, reset: 4.85 },
  'very-inverse-us': { a: 19.61, b: 0.491, p: 2, reset: 21.6 },
  'extremely-inverse-us': { a: 28.2, b: 0.1217, p: 2, reset: 29.1 },
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
