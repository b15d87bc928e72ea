import { formatNumber } from '@/lib/quantity/format-number'
import { caseEvents } from './case-events'
import { type CaseFigure, caseOf, type FigureSize } from './case-figure'
import { domainAround } from './domain'
import { linePlot } from './plot/line-plot'
import type { Scene } from './scene'
import { held, timeWindow } from './time-window'

const hertz = (value: number): string => formatNumber(value, { decimals: 2 })

/** Frequency of the generator that supplies a plant, against time; null where the network supplies it. */
export const frequencyPlot = (figure: CaseFigure, size: FigureSize = {}): Scene | null => {
  const { result } = figure
  const { generator } = result
  if (!generator || !result.series.generator) return null
  const window = timeWindow(result)
  const y = result.series.generator.frequency
  const series = [{ name: 'frequency', style: 0, ...held({ x: result.series.time, y }, window) }]
  const { lowestFrequency, settledFrequency } = generator
  const settled = settledFrequency === null ? 'does not settle' : `settles at ${hertz(settledFrequency)} Hz`
  return linePlot({
    width: size.width,
    height: size.height,
    title: `${caseOf(figure).tag}: frequency`,
    description: `Frequency: lowest ${hertz(lowestFrequency.frequency)} Hz at ${hertz(lowestFrequency.at)} s; ${settled}.`,
    x: { label: 'time from the first switching-on, s', domain: window, ticks: 8 },
    y: { label: 'frequency, Hz', domain: domainAround(series[0]!.y, [], 0.02) },
    series,
    events: caseEvents(figure, window),
  })
}
