import type { CaseResult } from '@/lib/engine/case-result'
import type { Curve } from './plot/decimate'

/** Change of voltage, in parts of the last value, that the eye no longer sees. */
const still = 2e-4
const leastTail = 0.05
const leadIn = 0.04

/** First and last instant worth drawing: a little of the state before, and of the settled state after the last visible change. */
export const timeWindow = (result: CaseResult): readonly [number, number] => {
  const { time, busVoltage } = result.series
  const first = time[0] ?? 0
  let last = first
  for (const values of Object.values(busVoltage)) {
    const settled = values.at(-1) ?? 0
    for (let i = values.length - 1; i >= 0 && time[i]! > last; i -= 1) {
      if (Math.abs(values[i]! - settled) > still * settled) last = time[i]!
    }
  }
  const span = last - first || 1
  return [Math.min(0, first) - leadIn * span, last + Math.max(leastTail, 0.08 * span)]
}

/** A sampled curve held at its first and last value to both ends of the window. */
export const held = (curve: Curve, [from, to]: readonly [number, number]): Curve => {
  const { x, y } = curve
  const length = Math.min(x.length, y.length)
  if (length === 0) return { x: [], y: [] }
  const before = from < x[0]! ? { x: [from], y: [y[0]!] } : { x: [], y: [] }
  const after = to > x[length - 1]! ? { x: [to], y: [y[length - 1]!] } : { x: [], y: [] }
  return {
    x: [...before.x, ...x.slice(0, length), ...after.x],
    y: [...before.y, ...y.slice(0, length), ...after.y],
  }
}
