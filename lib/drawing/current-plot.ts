import { formatNumber } from '@/lib/quantity/format-number'
import { caseEvents } from './case-events'
import { type CaseFigure, caseOf, type FigureSize, motorOf } from './case-figure'
import { domainAround } from './domain'
import { chosenMotors, type MotorChoice } from './motor-choice'
import { linePlot } from './plot/line-plot'
import type { SeriesSpec } from './plot/line-plot-spec'
import type { Scene } from './scene'
import { mostSeries } from './series-style'
import { held, timeWindow } from './time-window'

const differ = (a: readonly number[], b: readonly number[]): boolean =>
  a.some((value, i) => Math.abs(value - b[i]!) > 1e-3 * Math.abs(value))

/** Line and motor current against time; one curve where the starting device leaves them equal. */
export const currentPlot = (figure: CaseFigure, options: FigureSize & MotorChoice = {}): Scene => {
  const { document, result } = figure
  const window = timeWindow(result)
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
  // With many motors the line currents alone are drawn: they are what the supply sees.
  const chosen = curves.length > mostSeries ? curves.filter(({ name }) => !name.endsWith(' motor')) : curves
  const left = curves.filter((curve) => !chosen.slice(0, mostSeries).includes(curve))
  const series: SeriesSpec[] = chosen
    .slice(0, mostSeries)
    .map(({ name, y }, style) => ({ name, style, ...held({ x: result.series.time, y }, window) }))
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
    x: { label: 'time from the first switching-on, s', domain: window, ticks: 8 },
    y: {
      label: 'current, A (RMS)',
      domain: domainAround(
        series.flatMap((one) => one.y),
        [0],
      ),
    },
    series,
    events: caseEvents(figure, window),
    notes: left.length > 0 ? [`not drawn: ${left.map(({ name }) => name).join(', ')}`] : [],
  })
}
