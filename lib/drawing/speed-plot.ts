import { formatNumber } from '@/lib/quantity/format-number'
import { radianPerSecond } from '@/lib/units/si'
import { toRpm } from '@/lib/units/speed'
import { caseEvents } from './case-events'
import { type CaseFigure, caseOf, type FigureSize, motorOf } from './case-figure'
import { domainAround } from './domain'
import { chosenMotors, type MotorChoice } from './motor-choice'
import { linePlot } from './plot/line-plot'
import type { Scene } from './scene'
import { held, timeWindow } from './time-window'

/** Speed of up to six motors against time, with the speed criterion of a single one as a line to be reached. */
export const speedPlot = (figure: CaseFigure, options: FigureSize & MotorChoice = {}): Scene => {
  const { document, result } = figure
  const motors = chosenMotors(figure, options)
  const window = timeWindow(result)
  const series = motors.map(({ motorId }, style) => {
    const y = (result.series.motors[motorId]?.speed ?? []).map((value) => toRpm(radianPerSecond(value)))
    return { name: motorOf(document, motorId).tag, style, ...held({ x: result.series.time, y }, window) }
  })
  const criterion = document.settings.speedCriterion
  const rated = [
    ...new Set(motors.map(({ motorId }) => toRpm(radianPerSecond(motorOf(document, motorId).ratedSpeed.si)))),
  ]
  const limits =
    rated.length === 1 && motors.some((motor) => motor.start !== null)
      ? [
          {
            name: `${criterion.text} of rated speed, ${formatNumber(rated[0]! * criterion.si, { decimals: 0 })}\u2009r/min`,
            forbidden: 'above' as const,
            hatched: false,
            steps: [{ from: window[0], to: window[1], value: rated[0]! * criterion.si }],
          },
        ]
      : []
  return linePlot({
    width: options.width,
    height: options.height,
    title: `${caseOf(figure).tag}: speed of ${series.map((one) => one.name).join(', ')}`,
    description: motors
      .map(({ motorId, start, speedAtEnd }) => {
        const reached = start?.timeToCriterion ?? null
        const end = `${formatNumber(toRpm(speedAtEnd), { decimals: 0 })} r/min at the end`
        const criterionWords = `${criterion.text} of rated speed`
        const time =
          reached === null
            ? `${criterionWords} not reached`
            : `${criterionWords} after ${formatNumber(reached, { decimals: 2 })} s`
        return `${motorOf(document, motorId).tag}: ${start ? `${time}, ` : ''}${end}.`
      })
      .join(' '),
    x: { label: 'time from the first switching-on, s', domain: window, ticks: 8 },
    y: {
      label: 'speed, r/min',
      domain: domainAround(
        series.flatMap((one) => one.y),
        limits.flatMap((limit) => limit.steps.map((step) => step.value)),
        0.02,
      ),
    },
    series,
    limits,
    events: caseEvents(figure, window),
  })
}
