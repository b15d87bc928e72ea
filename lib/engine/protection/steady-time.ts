import type { RelayElement } from '../protection-input'
import { inverseTime } from './inverse-curve'
import { overloadTime } from './overload-class'
import { thermalTime } from './thermal-image'

/**
 * Time in s that an element needs at a steady current from its beginning, the slow end of an overload class.
 *
 * @param heat of a thermal image at the beginning, in parts of that which operates
 * @returns null where the current never operates it
 */
export function steadyTime(element: RelayElement, current: number, heat: number): number | null {
  switch (element.kind) {
    case 'definite':
      return current > element.pickUp ? element.delay : null
    case 'thermal-image':
      return thermalTime(element, current, heat)
    case 'overload-class':
      return overloadTime(element.class, current / element.setting, 'slow')
    case 'inverse':
      return inverseTime(element.curve, current / element.pickUp, element.multiplier)
  }
}

/** The least of the times that are there; null where none is. */
export const leastOf = (times: readonly (number | null)[]): number | null =>
  times.reduce((least, time) => (time === null || (least !== null && least <= time) ? least : time), null)
