import { type Second, second } from '../../units/si'
import type { CaseInput } from '../case-input'
import type { CaseResult } from '../case-result'
import { firstSwitching, type Measured, referenceVoltage, type VoltagePlace } from './measure'
import type { RuleInput, RuleLimit, RuleQuantity } from './rule'

/** A figure with the limit in force at its instant. */
export interface EnvelopePoint extends Measured {
  limit: number
}

type Envelope = Extract<RuleLimit, { kind: 'envelope' }>

/**
 * The point of the run at which a place comes closest to its envelope, or passes farthest beyond it, in parts of the
 * limit in force. After the run the settled voltage goes on and is held against the steps that are left.
 *
 * @returns null when the place has no series or the envelope no step
 */
export function worstUnderEnvelope(
  rule: RuleInput,
  envelope: Envelope,
  input: CaseInput,
  result: CaseResult,
  place: VoltagePlace,
): EnvelopePoint | null {
  const voltages = result.series.busVoltage[place.place.busId]
  const { time } = result.series
  if (!voltages || time.length === 0) return null
  const steps = [...envelope.steps].sort((a, b) => a.from - b.from)
  const firstAt = firstSwitching(input)
  const begin = beginOfRun(time, firstAt)
  const reference = referenceVoltage(place, rule.reference)
  const figure = (voltage: number): number =>
    rule.quantity === 'voltage-change' ? (place.place.before - voltage) / reference : voltage / reference
  const lastVoltage = place.place.settledAfterStart ?? voltages.at(-1)!

  let worst: EnvelopePoint | null = null
  const consider = (at: number, voltage: number, limit: number): void => {
    const value = figure(voltage)
    const margin = marginOf(rule, value, limit) / limit
    if (worst !== null && margin >= marginOf(rule, worst.value, worst.limit) / worst.limit) return
    worst = { kind: 'value', value, busId: place.place.busId, motorId: place.motor?.id ?? null, at: second(at), limit }
  }
  steps.forEach((step, index) => {
    const from = firstAt + step.from
    const to = firstAt + (steps[index + 1]?.from ?? Number.POSITIVE_INFINITY)
    const end = time.at(-1)!
    if (from <= end) consider(from, interpolate(time, voltages, from, begin), step.value)
    for (let i = begin; i < time.length; i++) {
      if (time[i]! >= from && time[i]! < to) consider(time[i]!, voltages[i]!, step.value)
    }
    if (to <= end) consider(to, interpolate(time, voltages, to, begin), step.value)
    else consider(Math.max(from, end), lastVoltage, step.value)
  })
  return worst
}

/** Whether a limit on a quantity is one from below. */
export const isFloor = (quantity: RuleQuantity): boolean =>
  quantity === 'remaining-voltage' ||
  quantity === 'accelerating-torque' ||
  quantity === 'trip-margin' ||
  quantity === 'thermal-margin'

/** Distance inside the limit, in its unit; negative beyond it. */
export function marginOf(rule: RuleInput, value: number, limit: number): number {
  return isFloor(rule.quantity) ? value - limit : limit - value
}

/** The sample just after the first switching-on: the later of two at that instant. */
function beginOfRun(time: readonly number[], firstAt: Second): number {
  let begin = time.findIndex((t) => t >= firstAt)
  if (begin < 0) return time.length
  while (time[begin + 1] === time[begin]) begin++
  return begin
}

function interpolate(time: readonly number[], values: readonly number[], t: number, begin: number): number {
  let i = begin
  while (i + 1 < time.length && time[i + 1]! <= t) i++
  const next = Math.min(i + 1, time.length - 1)
  const width = time[next]! - time[i]!
  const part = width > 0 ? Math.max(0, (t - time[i]!) / width) : 0
  return values[i]! + part * (values[next]! - values[i]!)
}
