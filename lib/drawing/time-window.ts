import type { CaseResult } from '@/lib/engine/case-result'

/** Change of voltage, in parts of the last value, that the eye no longer sees. */
const still = 2e-4
const least = 0.5

/** First and last instant worth drawing: the flat part after the last change is cut to a tenth of the run. */
export const timeWindow = (result: CaseResult): readonly [number, number] => {
  const { time, busVoltage } = result.series
  const first = time[0] ?? 0
  const end = time.at(-1) ?? 1
  let last = first
  for (const values of Object.values(busVoltage)) {
    const settled = values.at(-1) ?? 0
    for (let i = values.length - 1; i >= 0 && time[i]! > last; i -= 1) {
      if (Math.abs(values[i]! - settled) > still * settled) last = time[i]!
    }
  }
  return [first, Math.max(first + least, Math.min(end, last + 0.1 * (last - first)))]
}
