import type { EnvelopeRecord } from './envelope-record'
import type { FollowedStart } from './follow-start'
import type { TransientSeries } from './transient-result'

/** Points of the envelopes that a plot needs at most, and those of the beginning that are all kept. */
const [mostPoints, firstPoints] = [600, 60]

/** Envelopes and first periods to draw: few enough points for any length of run. */
export function transientSeries(
  motorId: string,
  record: EnvelopeRecord,
  { run }: FollowedStart,
  at: number,
  angle: number | null,
): TransientSeries {
  const stride = Math.max(1, Math.ceil((record.time.length - firstPoints) / mostPoints))
  const shown = record.time.flatMap((_, i) => (i < firstPoints || i % stride === 0 ? [i] : []))
  const pick = (values: readonly number[]) => shown.map((i) => values[i]!)
  /** Over the half periods up to the next shown one, so that nothing between is hidden. */
  const over = (values: readonly number[], worst: (...all: number[]) => number) =>
    shown.map((i, k) => worst(...values.slice(i, shown[k + 1] ?? values.length)))
  const { opening } = run
  const towards = angle ?? -run.peak.towards
  return {
    motorId,
    time: pick(record.time),
    current: pick(record.current),
    peak: over(record.peak, Math.max),
    torqueLow: over(record.torqueLow, Math.min),
    torque: pick(record.torque),
    torqueHigh: over(record.torqueHigh, Math.max),
    opening: {
      time: opening.time.map((t) => at + t),
      current: opening.re.map((re, i) => re * Math.cos(towards) - opening.im[i]! * Math.sin(towards)),
      torque: opening.torque,
    },
  }
}
