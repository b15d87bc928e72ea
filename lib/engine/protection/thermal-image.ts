import { type Second, second } from '../../units/si'

/** Thermal image of first order: heating time constant, and the current that it may carry without end. */
export interface ThermalImage {
  /** Time constant while current flows, s. */
  heating: Second
  /** Time constant at standstill, s. */
  cooling: Second
  /** Greatest lasting current k·I_b, A. */
  lasting: number
}

/** Heat in parts of that which operates, in the steady state of a current. */
export const steadyHeat = ({ lasting }: ThermalImage, current: number): number => (current / lasting) ** 2

/** Heat after a time with a steady current (zero: at standstill), from a heat before. */
export function heatAfter(image: ThermalImage, before: number, current: number, time: number): number {
  const end = steadyHeat(image, current)
  return end + (before - end) * Math.exp(-time / (current > 0 ? image.heating : image.cooling))
}

/**
 * Time to operate at a steady current, t = τ·ln((I² − I_p²)/(I² − (k·I_b)²)).
 *
 * Source: IEC 60255-149 (cold: I_p = 0; hot: after a lasting current I_p).
 *
 * @param before heat at the beginning, in parts of that which operates; 0 cold
 * @returns null where the current never operates it; 0 where it has operated already
 */
export function thermalTime(image: ThermalImage, current: number, before = 0): Second | null {
  if (before >= 1) return second(0)
  const end = steadyHeat(image, current)
  if (end <= 1) return null
  return second(image.heating * Math.log((end - before) / (end - 1)))
}

/** Rest that a machine needs until a start of known heat fits under the limit, s; null where it does not fit even cold. */
export function restBefore(image: ThermalImage, heatNow: number, heatOfStart: number): Second | null {
  const room = 1 - heatOfStart
  if (room <= 0) return null
  return second(heatNow <= room ? 0 : image.cooling * Math.log(heatNow / room))
}
