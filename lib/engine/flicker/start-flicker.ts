import { type Second, second } from '../../units/si'
import { flickermeter, longTermSeverity, shortTermSeverity } from './flickermeter'
import { type Lamp, lampOf } from './lamps'
import { severityOfChanges } from './shape-factor'

/** Rapid voltage change and flicker of the starts of a case at one place. */
export interface FlickerResult {
  busId: string
  lamp: Lamp
  /** Starts that were put into the ten minutes and into the two hours. */
  startsIn: { tenMinutes: number; twoHours: number }
  /** Settled and largest change in parts of nominal, and time during which the change exceeds 3.3 % of nominal. */
  settledChange: number | null
  largestChange: number
  timeAbove: Second
  shortTerm: { meter: number; shapeFactor: number }
  longTerm: { meter: number; shapeFactor: number }
}

/** The voltage of one place over a run. */
export interface PlaceCourse {
  busId: string
  nominal: number
  before: number
  deepest: number
  settled: number | null
  /** Rising times, s, two alike at a switching; voltages at them, V. */
  time: readonly number[]
  voltage: readonly number[]
}

/** Samples a second of the envelope, and of the sensations that are kept. */
const rate = 1000
const kept = 200
const tenMinutes = 600

/** Relative square of the voltage at even times: starts evenly over ten minutes, each stopped half-way to the next. */
function squares({ time, voltage, before }: PlaceCourse, starts: number): Float64Array {
  const interval = tenMinutes / starts
  const values = new Float64Array(rate * tenMinutes).fill(1)
  // A start stands a second into its interval, and a stop brings the voltage before it back.
  const lead = 1
  const stop = starts === 1 ? Number.POSITIVE_INFINITY : lead + (interval - lead) / 2
  const last = time.length - 1
  const settled = (voltage[last]! / before) ** 2
  for (let turn = 0; turn < starts; turn++) {
    const from = Math.ceil((turn * interval + lead) * rate - 1e-9)
    const to = Math.min(values.length, Math.ceil((turn * interval + Math.min(stop, interval)) * rate - 1e-9))
    let k = 0
    let i = from
    for (; i < to; i++) {
      const t = time[0]! + i / rate - turn * interval - lead
      while (k < last && time[k + 1]! <= t) k++
      if (k === last) break
      const u = voltage[k]! + ((voltage[k + 1]! - voltage[k]!) * (t - time[k]!)) / (time[k + 1]! - time[k]!)
      values[i] = (u / before) ** 2
    }
    values.fill(settled, i, to)
  }
  return values
}

/** Sensation, in parts of the largest, below which a steady voltage is no longer followed. */
const faded = 1e-13

function meterShortTerm(course: PlaceCourse, starts: number, lamp: Lamp): number {
  const values = squares(course, starts)
  let sum = 0
  for (const value of values) sum += value
  const mean = sum / values.length
  const meter = flickermeter(lamp, rate)
  const offset = values[0]! / mean - 1
  const sensations = new Float64Array(kept * tenMinutes)
  const step = rate / kept
  let largest = 0
  let changed = 0
  for (let i = 0; i < values.length; i++) {
    // The record begins in the steady state: what was before it is its first value.
    const sensation = meter(values[i]! / mean - 1 - offset)
    if (i % step === step - 1) sensations[(i + 1) / step - 1] = sensation
    largest = Math.max(largest, sensation)
    if (i > 0 && values[i] !== values[i - 1]) changed = i
    // While the voltage has long stood still and the lamp with it, there is nothing to follow.
    if (i - changed > 5 * rate && sensation <= faded * largest) while (values[i + 1] === values[i]) i++
  }
  return shortTermSeverity(sensations)
}

function timeAbove({ time, voltage, before, nominal }: PlaceCourse, change: number): Second {
  let sum = 0
  const limit = before - change * nominal
  for (let k = 0; k + 1 < time.length; k++) {
    const [a, b] = [voltage[k]! - limit, voltage[k + 1]! - limit]
    const step = time[k + 1]! - time[k]!
    if (a < 0 && b < 0) sum += step
    else if (a < 0 || b < 0) sum += (step * Math.min(a, b)) / (Math.min(a, b) - Math.max(a, b))
  }
  return second(sum)
}

/**
 * Flicker of a case's starts, repeated as often as the study intends, by flickermeter and by shape factor.
 *
 * The short term is the worst ten minutes (at least one start in it), the long term two hours of ten-minute periods,
 * each with a start or without. The meter sees the simulated RMS voltage; the shape-factor method takes F = 1.
 *
 * @param startsPerHour intended starts an hour
 */
export function startFlicker(course: PlaceCourse, startsPerHour: number, frequency: number): FlickerResult {
  const lamp = lampOf(frequency)
  const startsIn = {
    tenMinutes: Math.max(1, Math.ceil(startsPerHour / 6 - 1e-9)),
    twoHours: Math.max(1, Math.ceil(2 * startsPerHour - 1e-9)),
  }
  const largestChange = Math.max(0, (course.before - course.deepest) / course.nominal)
  const meter = meterShortTerm(course, startsIn.tenMinutes, lamp)
  const shapeFactor = severityOfChanges(largestChange, startsIn.tenMinutes)
  const periods = Math.min(12, Math.ceil(startsIn.twoHours / startsIn.tenMinutes))
  const overTwoHours = (each: number) =>
    longTermSeverity(Array.from({ length: 12 }, (_, i) => (i < periods ? each : 0)))
  return {
    busId: course.busId,
    lamp,
    startsIn,
    settledChange: course.settled === null ? null : (course.before - course.settled) / course.nominal,
    largestChange,
    timeAbove: timeAbove(course, 0.033),
    shortTerm: { meter, shapeFactor },
    longTerm: { meter: overTwoHours(meter), shapeFactor: overTwoHours(shapeFactor) },
  }
}
