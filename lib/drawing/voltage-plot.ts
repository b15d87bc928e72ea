import type { PlaceResult } from '@/lib/engine/case-result'
import { formatNumber } from '@/lib/quantity/format-number'
import { printQuantity } from '@/lib/quantity/print-quantity'
import { caseEvents } from './case-events'
import { busOf, type CaseFigure, caseOf, type FigureSize, placeOf } from './case-figure'
import { domainAround } from './domain'
import { linePlot } from './plot/line-plot'
import type { EndMarkSpec, LimitSpec, MarkerSpec } from './plot/line-plot-spec'
import type { Scene } from './scene'
import { mostSeries } from './series-style'
import { held, timeWindow } from './time-window'
import { voltageLimits } from './voltage-limits'

const percent = (value: number, decimals = 2) => `${formatNumber(100 * value, { decimals })}\u2009%`

const volts = (value: number) => printQuantity(value, 'voltage', { digits: 4 })

/** The deepest point with its change against the voltage before. */
const deepest = ({ before, nominal, deepest: { voltage, at } }: PlaceResult): MarkerSpec => ({
  x: at,
  y: (100 * voltage) / nominal,
  name: `deepest ${volts(voltage)}, change ${percent((before - voltage) / before)} at ${formatNumber(at, { decimals: 2 })}\u2009s`,
})

/** The settled voltage once the process loads are on, where that moves it. */
const withProcess = ({ nominal, settledAfterStart, settledAfterProcess }: PlaceResult): readonly EndMarkSpec[] => {
  if (settledAfterProcess === null) return []
  const moved = settledAfterStart === null || Math.abs(settledAfterProcess - settledAfterStart) > 1e-4 * nominal
  return moved ? [{ y: (100 * settledAfterProcess) / nominal, name: 'with process' }] : []
}

const inWords = (figure: CaseFigure, busIds: readonly string[]): string =>
  busIds
    .flatMap((id) => {
      const place = placeOf(figure.result, id)
      if (!place) return []
      const part = (value: number) => percent(value / place.nominal, 1)
      return `${busOf(figure.document, id).tag}: ${part(place.before)} of nominal before the start, lowest ${part(place.deepest.voltage)} at ${formatNumber(place.deepest.at, { decimals: 2 })} s.`
    })
    .join(' ')

/** A limit on the highest voltage that is far away would only flatten the dip; it is named beside the plot instead. */
const nearLevels = (limits: readonly LimitSpec[], values: readonly number[]): readonly number[] => {
  const highest = values.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY)
  const span = highest - values.reduce((a, b) => Math.min(a, b), Number.POSITIVE_INFINITY)
  return limits
    .flatMap((limit) => limit.steps.map((step) => step.value))
    .filter((level) => level - highest < Math.max(0.3 * span, 1))
}

/**
 * Remaining voltage against time at up to six buses, in per cent of each bus's nominal voltage. With a single bus the limits
 * that apply to it in this case are drawn, and its deepest point is read off.
 */
export const voltagePlot = (
  figure: CaseFigure,
  { busIds, ...size }: FigureSize & { busIds: readonly string[] },
): Scene => {
  const shown = busIds.slice(0, mostSeries)
  const window = timeWindow(figure.result)
  const only = shown.length === 1 ? shown[0] : undefined
  const nominal = only === undefined ? 1 : busOf(figure.document, only).nominal.si
  const limits = (only === undefined ? [] : voltageLimits(figure, only, window)).map((limit) => ({
    ...limit,
    steps: limit.steps.map((step) => ({ ...step, value: (100 * step.value) / nominal })),
  }))
  const series = shown.map((id, style) => {
    const bus = busOf(figure.document, id)
    const values = figure.result.series.busVoltage[id] ?? []
    const y = values.map((value) => (100 * value) / bus.nominal.si)
    return { name: bus.tag, style, ...held({ x: figure.result.series.time, y }, window) }
  })
  const place = only === undefined ? undefined : placeOf(figure.result, only)
  const endMarks = place ? withProcess(place) : []
  const values = [...series.flatMap((one) => one.y), ...endMarks.map((mark) => mark.y)]
  return linePlot({
    ...size,
    title: `${caseOf(figure).tag}: voltage at ${series.map((one) => one.name).join(', ')}`,
    description: inWords(figure, shown),
    x: { label: 'time from the first switching-on, s', domain: window, ticks: 8 },
    y: {
      label: 'line voltage, % of nominal',
      domain: domainAround(values, nearLevels(limits, values)),
    },
    series,
    limits,
    events: caseEvents(figure, window),
    markers: place ? [deepest(place)] : [],
    endMarks,
  })
}

/** Buses that a voltage limit in use applies to in this case, in the order of the records. */
export const limitedBuses = (figure: CaseFigure): readonly string[] =>
  figure.document.plant.buses.map((bus) => bus.id).filter((id) => voltageLimits(figure, id, [0, 1]).length > 0)
