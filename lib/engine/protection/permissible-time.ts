import { type Second, second } from '../../units/si'
import type { ThermalData } from '../protection-input'

/** A point of a thermal limit: this current for so long, A and s. */
export interface LimitPoint {
  current: number
  time: number
}

/**
 * Permissible time at a current, I²·t = const through the declared point.
 *
 * Common practice for a stalled rotor; with the current in proportion to the voltage the time goes with 1/U².
 */
export const permissibleTimeAt = (current: number, declared: LimitPoint): Second =>
  second(declared.time * (declared.current / current) ** 2)

/** The thermal limit of a machine in one state by rising current: points of its curve and the locked-rotor time. */
export function limitPoints(
  thermal: ThermalData,
  state: 'hot' | 'cold',
  lockedRotorCurrent: number | null,
): readonly LimitPoint[] {
  const locked = state === 'hot' ? thermal.hot : thermal.cold
  const points: LimitPoint[] = thermal.limits.filter((point) => point.state === state)
  const all =
    locked === null || lockedRotorCurrent === null
      ? points
      : [
          ...points.filter(({ current }) => current !== lockedRotorCurrent),
          { current: lockedRotorCurrent, time: locked },
        ]
  return all.toSorted((a, b) => a.current - b.current)
}

/**
 * Permissible time at a current by the points of a limit: straight on logarithmic scales between them, I²·t = const
 * beyond the highest, and below a single point (a locked rotor at reduced voltage). Below the lowest of several points
 * there is no statement. Source: as IEEE 620 presents thermal limit curves; interpolation is a choice.
 *
 * @returns null where the points say nothing
 */
export function permissibleTime(points: readonly LimitPoint[], current: number): Second | null {
  const last = points.at(-1)
  if (last === undefined || !(current > 0)) return null
  if (points.length === 1 || current >= last.current) return permissibleTimeAt(current, last)
  const above = points.findIndex((point) => point.current >= current)
  const [a, b] = [points[above - 1], points[above]!]
  if (a === undefined) return b.current === current ? second(b.time) : null
  const part = Math.log(current / a.current) / Math.log(b.current / a.current)
  return second(a.time * (b.time / a.time) ** part)
}
