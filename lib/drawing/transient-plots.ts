import type { TransientSeries } from '@/lib/engine/dynamic/transient-result'
import { formatNumber } from '@/lib/quantity/format-number'
import { type CaseFigure, caseOf, type FigureSize, motorOf } from './case-figure'
import { domainAround } from './domain'
import { linePlot } from './plot/line-plot'
import type { SeriesSpec, ShadeSpec } from './plot/line-plot-spec'
import type { Scene } from './scene'

interface Panel {
  what: string
  unit: string
  series: readonly SeriesSpec[]
  shade?: ShadeSpec
  description: string
}

const scaled = (values: readonly number[], scale: number): number[] => values.map((value) => value / scale)

const panel = (figure: CaseFigure, size: FigureSize, transient: TransientSeries, content: Panel): Scene => {
  const { what, unit, series, shade, description } = content
  const { tag } = motorOf(figure.document, transient.motorId)
  const ends = series.flatMap(({ x }) => [x[0] ?? 0, x.at(-1) ?? 0])
  return linePlot({
    width: size.width,
    height: size.height,
    title: `${caseOf(figure).tag}: ${what} of ${tag}, fifth-order model`,
    description,
    x: { label: 'time from the first switching-on, s', domain: [Math.min(...ends), Math.max(...ends)], ticks: 8 },
    y: {
      label: `${what}, ${unit}`,
      domain: domainAround([...series.flatMap(({ y }) => y), ...(shade ? [...shade.lower, ...shade.upper] : [])], [0]),
    },
    series,
    ...(shade && { shade }),
  })
}

/** Envelopes of the current over the whole start: RMS over half a period, and the largest instantaneous value. */
const currentEnvelope = (figure: CaseFigure, size: FigureSize, transient: TransientSeries): Scene => {
  const { time: x, current, peak } = transient
  return panel(figure, size, transient, {
    what: 'current',
    unit: 'A',
    series: [
      { name: 'RMS over half a period', style: 0, x, y: current },
      { name: 'peak', style: 1, x, y: peak },
    ],
    description: `Largest RMS over half a period ${formatNumber(Math.max(...current), { digits: 4 })} A, largest peak ${formatNumber(Math.max(...peak), { digits: 4 })} A.`,
  })
}

/** Torque over the whole start: mean over a period, and between which values it swings. */
const torqueEnvelope = (figure: CaseFigure, size: FigureSize, transient: TransientSeries): Scene => {
  const { time: x, torque, torqueLow, torqueHigh } = transient
  return panel(figure, size, transient, {
    what: 'torque',
    unit: 'kN·m',
    series: [{ name: 'mean over a period', style: 0, x, y: scaled(torque, 1e3) }],
    shade: { name: 'swing', x, lower: scaled(torqueLow, 1e3), upper: scaled(torqueHigh, 1e3) },
    description: `Between ${formatNumber(Math.min(...torqueLow) / 1e3, { digits: 4 })} and ${formatNumber(Math.max(...torqueHigh) / 1e3, { digits: 4 })} kN·m.`,
  })
}

const within = ({ time, opening }: TransientSeries): number => {
  const last = opening.time.at(-1) ?? 0
  return time.filter((t) => t <= last).length
}

/** Current of the phase with the highest peak in the first periods, between the envelopes of its RMS. */
const openingCurrent = (figure: CaseFigure, size: FigureSize, transient: TransientSeries): Scene => {
  const { time, current, opening } = transient
  const shown = within(transient)
  const crest = current.slice(0, shown).map((value) => Math.SQRT2 * value)
  return panel(figure, size, transient, {
    what: 'current in the first periods',
    unit: 'A',
    series: [
      { name: 'phase a', style: 0, x: opening.time, y: opening.current },
      { name: '√2 × RMS of half a period', style: 1, x: time.slice(0, shown), y: crest },
    ],
    description: `Largest value ${formatNumber(Math.max(...opening.current.map(Math.abs)), { digits: 4 })} A.`,
  })
}

/** Torque in the first periods, with its mean over a period. */
const openingTorque = (figure: CaseFigure, size: FigureSize, transient: TransientSeries): Scene => {
  const { time, torque, opening } = transient
  const shown = within(transient)
  return panel(figure, size, transient, {
    what: 'torque in the first periods',
    unit: 'kN·m',
    series: [
      { name: 'torque', style: 0, x: opening.time, y: scaled(opening.torque, 1e3) },
      { name: 'mean over a period', style: 1, x: time.slice(0, shown), y: scaled(torque.slice(0, shown), 1e3) },
    ],
    description: `Largest value ${formatNumber(Math.max(...opening.torque) / 1e3, { digits: 4 })} kN·m.`,
  })
}

/** The four figures of a start by the fifth-order model; none for other cases. */
export const transientPlots = (figure: CaseFigure, size: FigureSize = {}): readonly Scene[] => {
  const { transient } = figure.result.series
  if (!transient) return []
  return [openingCurrent, openingTorque, currentEnvelope, torqueEnvelope].map((draw) => draw(figure, size, transient))
}
