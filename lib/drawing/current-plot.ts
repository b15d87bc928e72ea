import { formatNumber } from '@/lib/quantity/format-number'
import { caseEvents } from './case-events'
import { type CaseFigure, caseOf, type FigureSize, motorOf } from './case-figure'
import { domainAround } from './domain'
import { chosenMotors, type MotorChoice } from './motor-choice'
import { linePlot } from './plot/line-plot'
import type { SeriesSpec } from './plot/line-plot-spec'
import type { Scene } from './scene'
import { mostSeries } from './series-style'
import { timeWindow } from './time-window'

const differ = (a: readonly number[], b: readonly number[]): boolean =>
  a.some((value, i) => Math.abs(value - b[i]!) > 1e-3 * Math.abs(value))

/** Line and motor current against time; one curve where the starting device leaves them equal. */
export const currentPlot = (figure: CaseFigure, options: FigureSize & MotorChoice = {}): Scene => {
  const { document, result } = figure
  const motors = chosenMotors(figure, options)
  const curves = motors.flatMap(({ motorId }) => {
    const series = result.series.motors[motorId]
    if (!series) return []
    const { tag } = motorOf(document, motorId)
    return differ(series.lineCurrent, series.motorCurrent)
      ? [
          { name: `${tag} line`, y: series.lineCurrent },
          { name: `${tag} motor`, y: series.motorCurrent },
        ]
      : [{ name: tag, y: series.lineCurrent }]
  })
  const series: SeriesSpec[] = curves
    .slice(0, mostSeries)
    .map(({ name, y }, style) => ({ name, y, style, x: result.series.time }))
  const ampere = (value: number) => `${formatNumber(value, { digits: 4 })} A`
  return linePlot({
    width: options.width,
    height: options.height,
    title: `${caseOf(figure).tag}: current of ${motors.map(({ motorId }) => motorOf(document, motorId).tag).join(', ')}`,
    description: motors
      .map(({ motorId, start }) =>
        start
          ? `${motorOf(document, motorId).tag}: ${ampere(start.standstill.lineCurrent)} from the line and ${ampere(start.standstill.motorCurrent)} in the motor at standstill.`
          : `${motorOf(document, motorId).tag} runs throughout.`,
      )
      .join(' '),
    x: { label: 'time from the first switching-on, s', domain: timeWindow(result), ticks: 8 },
    y: {
      label: 'current, A (RMS)',
      domain: domainAround(
        series.flatMap((one) => one.y),
        [0],
      ),
    },
    series,
    events: caseEvents(figure),
  })
}
