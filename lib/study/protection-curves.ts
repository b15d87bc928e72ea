import { limitPoints, permissibleTime } from '../engine/protection/permissible-time'
import { steadyTime } from '../engine/protection/steady-time'
import type { MotorRecord } from './document/machine-records'
import type { StudySettings } from './document/study-document'
import { protectionInput, thermalInput } from './to-engine/protection-input'
import { elementName } from './words/protection-words'

/** Time against current at a steady current, A and s, by rising current. */
export interface TimeCurrentCurve {
  kind: 'element' | 'limit'
  name: string
  current: readonly number[]
  time: readonly number[]
}

/** Points of a curve on logarithmic scales. */
const count = 160

const spaced = (from: number, to: number): number[] =>
  Array.from({ length: count + 1 }, (_, k) => from * (to / from) ** (k / count))

const sampled = (
  kind: TimeCurrentCurve['kind'],
  name: string,
  currents: readonly number[],
  timeOf: (current: number) => number | null,
): TimeCurrentCurve[] => {
  const points = currents.flatMap((current) => {
    const time = timeOf(current)
    return time === null || !(time > 0) ? [] : [{ current, time }]
  })
  if (points.length < 2) return []
  return [{ kind, name, current: points.map((one) => one.current), time: points.map((one) => one.time) }]
}

/** Upright at its setting down to its delay, then level. */
const definite = (name: string, pickUp: number, delay: number, to: number): TimeCurrentCurve[] =>
  pickUp >= to
    ? []
    : [
        {
          kind: 'element',
          name,
          current: [pickUp, pickUp, to],
          time: [longest, Math.max(atOnce, delay), Math.max(atOnce, delay)],
        },
      ]

/** Beyond every figure, s. */
const longest = 1e6

/** Least time that a curve on logarithmic scales can show. */
const atOnce = 1e-3

/**
 * Curves of a motor's relay and of its thermal limits, for a figure of time against current.
 *
 * @param heats heat of each element at switching-on, in parts of that which trips; 0 for all but thermal images
 * @param range currents that are drawn, A; primary, on the side of the starting device that the relay measures
 */
export const timeCurrentCurves = (
  motor: MotorRecord,
  state: StudySettings['thermalState'],
  heats: readonly number[],
  range: { from: number; to: number },
): TimeCurrentCurve[] => {
  const { protection } = protectionInput(motor, state)
  const elements = (protection?.elements ?? []).flatMap((element, k) => {
    const typed = motor.protection?.elements[k]
    if (!typed) return []
    if (element.kind === 'definite') return definite(elementName(typed), element.pickUp, element.delay, range.to)
    // The setting itself begins the curve, however coarse the spacing.
    const setting = 'pickUp' in element ? element.pickUp : null
    const currents = spaced(range.from, range.to)
    if (setting !== null && setting > range.from && setting < range.to) currents.push(setting * 1.001)
    currents.sort((a, b) => a - b)
    const timeOf = (current: number): number | null => {
      const time = steadyTime(element, current, heats[k] ?? 0)
      return time === null ? null : Math.max(atOnce, time)
    }
    return sampled('element', elementName(typed), currents, timeOf)
  })
  const { thermal } = thermalInput(motor)
  const locked = motor.lockedRotorCurrent?.si ?? null
  const limits = (['cold', 'hot'] as const).flatMap((which) => {
    const points = thermal ? limitPoints(thermal, which, locked) : []
    const [first] = points
    if (first === undefined) return []
    // A single point stands for a locked rotor at reduced voltage: half of it is far enough down.
    const from = points.length === 1 ? first.current / 2 : first.current
    const to = Math.min(range.to, 1.1 * points.at(-1)!.current)
    return sampled('limit', `motor limit ${which}`, spaced(from, to), (current) => permissibleTime(points, current))
  })
  return [...elements, ...limits]
}
