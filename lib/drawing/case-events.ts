import { formatNumber } from '@/lib/quantity/format-number'
import { type CaseFigure, motorOf } from './case-figure'
import type { EventSpec } from './plot/line-plot-spec'

/** Instants closer than this part of the plot share one name. */
const close = 0.03

const seconds = (value: number) => `${formatNumber(value, { decimals: 2 })}\u2009s`

/** Change-overs of the starting devices to their running position, and motors taken off; those at nearly the same instant are named together. */
export const caseEvents = (
  { document, result }: CaseFigure,
  window: readonly [number, number],
): readonly EventSpec[] => {
  const several = result.motors.filter((motor) => motor.start !== null).length > 1
  const changes = result.changeOvers
    .filter((one) => one.to === 'running' || one.to === 'off')
    .toSorted((a, b) => a.at - b.at)
  const groups: (typeof changes)[] = []
  for (const change of changes) {
    const group = groups.at(-1)
    if (group && change.at - group[0]!.at < close * (window[1] - window[0])) group.push(change)
    else groups.push([change])
  }
  return groups.map((group) => {
    const first = group[0]!
    const tags = group.map((one) => motorOf(document, one.motorId).tag).join(', ')
    const when = group.length > 1 ? `from ${seconds(first.at)}` : seconds(first.at)
    const what = group.every(({ to }) => to === 'off') ? 'off' : 'change-over'
    return { name: `${several ? `${tags} ` : ''}${what} ${when}`, at: first.at }
  })
}
