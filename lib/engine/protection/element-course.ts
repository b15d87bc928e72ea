import type { RelayElement } from '../protection-input'
import { definiteCourse } from './definite-course'
import { inverseCurves, inverseTime } from './inverse-curve'
import { overloadTime } from './overload-class'
import { heatAfter, steadyHeat, thermalTime } from './thermal-image'

/** An element of a relay on its way through a changing current. */
export interface ElementCourse {
  /** Time that it still needs if this current stays, s; 0 where it has operated, null where it never would. */
  timeLeft(current: number): number | null
  /**
   * Takes the element over a step in which the current runs straight from one value to another.
   *
   * @returns time into the step at which it operates, s; null where it does not
   */
  advance(step: number, from: number, to: number): number | null
  /** How far it has come, in parts of what operates. */
  travelled(): number
}

/** Rates at which an element travels and falls back, in parts of the whole a second. */
interface Rates {
  timeOf(current: number): number | null
  /** Positive, below the setting. */
  reset(current: number): number
}

/**
 * An element that operates when ∫dt/t(I) has come to 1; each step takes the mean of the rates at its ends.
 * Source: IEC 60255-151 and IEEE C37.112, dynamic characteristic.
 */
function travelling({ timeOf, reset }: Rates): ElementCourse {
  let travelled = 0
  const rate = (current: number): number => {
    const time = timeOf(current)
    return time === null ? -reset(current) : 1 / time
  }
  return {
    travelled: () => travelled,
    timeLeft: (current) => {
      const time = timeOf(current)
      return time === null ? null : Math.max(0, 1 - travelled) * time
    },
    advance(step, currentFrom, currentTo) {
      const [from, to] = [rate(currentFrom), rate(currentTo)]
      // A reset at once has no rate to take a mean with.
      if (from === Number.NEGATIVE_INFINITY || to === Number.NEGATIVE_INFINITY) {
        if (step > 0) travelled = 0
        return null
      }
      const gain = (step * (from + to)) / 2
      const left = 1 - travelled
      travelled = Math.max(0, travelled + gain)
      if (left <= 0 || gain < left) return null
      // The rate runs straight in time within the step: from·τ + (to − from)·τ²/(2·step) = what is left.
      const slope = (to - from) / step
      const steady = Math.abs(slope) * step < 1e-12 * from
      return steady ? left / from : (Math.sqrt(from ** 2 + 2 * slope * left) - from) / slope
    },
  }
}

function thermal(element: Extract<RelayElement, { kind: 'thermal-image' }>): ElementCourse {
  let heat = steadyHeat(element, element.before)
  return {
    travelled: () => heat,
    timeLeft: (current) => thermalTime(element, current, heat),
    advance(step, from, to) {
      const current = Math.sqrt((from * from + from * to + to * to) / 3)
      const time = heat < 1 ? thermalTime(element, current, heat) : null
      heat = heatAfter(element, heat, current, step)
      return time !== null && time <= step ? time : null
    },
  }
}

/** Reset rate of an inverse element by M: (1 − M²)/t_r, at once where there is no reset time. */
const resetRate = (time: number, multiple: number): number =>
  time > 0 ? Math.max(0, 1 - multiple ** 2) / time : Number.POSITIVE_INFINITY

/**
 * The course of an element from the beginning of a run.
 *
 * @param end which end of the band of an overload class counts; other elements have one curve
 */
export function elementCourse(element: RelayElement, end: 'fast' | 'slow'): ElementCourse {
  switch (element.kind) {
    case 'definite':
      return definiteCourse(element)
    case 'thermal-image':
      return thermal(element)
    case 'overload-class':
      // A class says nothing about cooling: what was heated up stays, which is on the safe side of a start.
      return travelling({
        timeOf: (current) => overloadTime(element.class, current / element.setting, end),
        reset: () => 0,
      })
    case 'inverse': {
      const { curve, pickUp, multiplier } = element
      const reset = element.reset ?? multiplier * inverseCurves[curve].reset
      return travelling({
        timeOf: (current) => inverseTime(curve, current / pickUp, multiplier),
        reset: (current) => resetRate(reset, current / pickUp),
      })
    }
  }
}
