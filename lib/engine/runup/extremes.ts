import { findMinimum } from '../numeric/minimum'

/** A quantity whose least (or, turned over, largest) value over the run is wanted. */
export interface Watch {
  /** Place in the observation. */
  place: number
  /** 1 for the least value, −1 for the largest. */
  sign: 1 | -1
  /** Only looked at while this holds. */
  active: boolean
  /** The extreme so far; NaN before anything was seen. */
  value: number
  at: number
}

export const watch = (place: number, sign: 1 | -1, active: boolean): Watch => ({
  place,
  sign,
  active,
  value: Number.NaN,
  at: Number.NaN,
})

/** Differences smaller than this part of a value are taken for noise of the solution. */
const roundOff = 1e-10

export interface ExtremeSearch {
  /** Takes the next point of a smooth stretch; between it and the two before, extremes are searched for. */
  add(t: number, observation: Float64Array): void
  /** The next point does not continue smoothly from the last. */
  breakHere(): void
}

/**
 * Finds extremes between points: where three successive points enclose one and a parabola through them betters the
 * record, the minimum is searched with the network solved at interpolated speeds.
 *
 * @param observeAt observation at an instant of the last two steps; false where there is none
 */
export function createExtremeSearch(
  watches: readonly Watch[],
  length: number,
  observeAt: (t: number, into: Float64Array) => boolean,
): ExtremeSearch {
  let [older, old, fresh] = [new Float64Array(length), new Float64Array(length), new Float64Array(length)]
  let [olderTime, oldTime, freshTime] = [0, 0, 0]
  let known = 0
  const probe = new Float64Array(length)

  function record(each: Watch, value: number, at: number): void {
    if (!(each.sign * value >= each.sign * each.value)) {
      each.value = value
      each.at = at
    }
  }

  /** Least value of the parabola through three points, or infinity where the middle one is not clearly the lowest. */
  function vertex(each: Watch): number {
    const a = each.sign * older[each.place]!
    const b = each.sign * old[each.place]!
    const c = each.sign * fresh[each.place]!
    if (!(b <= a && b <= c) || a - b + (c - b) < roundOff * Math.abs(b)) return Number.POSITIVE_INFINITY
    const left = oldTime - olderTime
    const right = freshTime - oldTime
    const slopeLeft = (b - a) / left
    const slopeRight = (c - b) / right
    const bend = (slopeRight - slopeLeft) / (left + right)
    const slope = (slopeLeft * right + slopeRight * left) / (left + right)
    return b - (slope * slope) / (4 * bend)
  }

  function refine(each: Watch): void {
    const best = vertex(each)
    if (!Number.isFinite(best) || !(each.at === oldTime || best < each.sign * each.value)) return
    const inside = { at: oldTime, value: each.sign * old[each.place]! }
    const found = findMinimum(
      (t) => (observeAt(t, probe) ? each.sign * probe[each.place]! : Number.POSITIVE_INFINITY),
      olderTime,
      inside,
      freshTime,
      1e-4 * (freshTime - olderTime),
    )
    record(each, each.sign * found.value, found.at)
  }

  return {
    add(t, observation) {
      const recycled = older
      older = old
      old = fresh
      fresh = recycled
      olderTime = oldTime
      oldTime = freshTime
      fresh.set(observation)
      freshTime = t
      known = Math.min(3, known + 1)
      for (const each of watches) {
        if (!each.active) continue
        record(each, fresh[each.place]!, t)
        if (known === 3) refine(each)
      }
    },
    breakHere() {
      known = 0
    },
  }
}
