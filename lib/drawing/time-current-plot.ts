import { printQuantity } from '@/lib/quantity/print-quantity'
import { type TimeCurrentCurve, timeCurrentCurves } from '@/lib/study/protection-curves'
import { settingRatio } from '@/lib/study/to-engine/protection-input'
import { marginText } from '@/lib/study/words/protection-words'
import { type CaseFigure, caseOf, type FigureSize, motorOf } from './case-figure'
import { linePlot } from './plot/line-plot'
import type { MarkerSpec, SeriesSpec } from './plot/line-plot-spec'
import type { Scene } from './scene'
import { mostSeries } from './series-style'

const amperes = (value: number): string => printQuantity(value, 'current', { unit: 'A', digits: 3 })

/** The next of 1, 2 and 5 times a power of ten below or above a value. */
const round = (value: number, up: boolean): number => {
  const decade = 10 ** Math.floor(Math.log10(value))
  const steps = [1, 2, 5, 10].map((digit) => digit * decade)
  return up
    ? (steps.find((step) => step >= value * (1 - 1e-9)) ?? value)
    : (steps.findLast((step) => step <= value * (1 + 1e-9)) ?? value)
}

interface Trace {
  current: readonly number[]
  time: readonly number[]
}

/** Current of the start that counts, on the relay's side, against the time from its switching-on. */
const traceOf = ({ result }: CaseFigure, motorId: string, side: 'line' | 'motor', least: number): Trace | null => {
  const start = result.motors.find((motor) => motor.motorId === motorId)?.start
  const series = result.series.motors[motorId]
  if (!start || !series) return null
  const values = side === 'line' ? series.lineCurrent : series.motorCurrent
  const current: number[] = []
  const time: number[] = []
  result.series.time.forEach((t, i) => {
    const since = t - start.switchedOnAt
    // The sample before the switching stands at the same instant.
    const before = since === 0 && result.series.time[i + 1] === t
    if (since < 0 || before || !(values[i]! > 0)) return
    current.push(values[i]!)
    time.push(Math.max(least, since))
  })
  return current.length < 2 ? null : { current, time }
}

/** Shortest time that is drawn, s. */
const shortest = 0.01

/** Style of a curve: elements from the first style on, limits behind them; the start has the first. */
const styled = (curves: readonly TimeCurrentCurve[], free: number): SeriesSpec[] =>
  curves.slice(0, free).map(({ name, current, time }, k) => ({ name, x: current, y: time, style: k + 1 }))

/**
 * Time against current on logarithmic scales: the start as it runs, the elements of the relay at a steady current, the
 * thermal limits of the motor; null where the motor has no relay or the case no curve of it.
 */
export const timeCurrentPlot = (
  figure: CaseFigure,
  { motorId, ...size }: FigureSize & { motorId: string },
): Scene | null => {
  const { document, result } = figure
  const motor = motorOf(document, motorId)
  const start = result.motors.find((one) => one.motorId === motorId)?.start
  if (motor.protection === null || !start?.protection) return null
  const side = motor.protection.measures
  const trace = traceOf(figure, motorId, side, shortest)
  if (trace === null) return null
  const running = Math.min(...trace.current.slice(-1), motor.ratedCurrent?.si ?? Number.POSITIVE_INFINITY)
  const highest = Math.max(...trace.current, motor.lockedRotorCurrent?.si ?? 0)
  const settings = motor.protection.elements.flatMap((element) => ('pickUp' in element ? [element.pickUp.si] : []))
  // A high-set stage is drawn while it does not crowd the start into a corner.
  const ratio = settingRatio(motor.protection)
  const near = settings.map((value) => ratio * value).filter((value) => value < 4 * highest)
  const range = { from: round(0.6 * running, false), to: round(1.2 * Math.max(1.25 * highest, ...near), true) }
  const heats = start.protection.elements.map(({ heat }) => heat?.before ?? 0)
  const curves = timeCurrentCurves(motor, document.settings.thermalState, heats, range)
  const longest = Math.max(...curves.flatMap(({ time }) => Math.min(...time)), ...trace.time)
  const lowest = Math.min(...curves.flatMap(({ time }) => time)) < 0.1 ? 0.01 : 0.1
  const time = [lowest, Math.max(100, Math.min(10_000, round(10 * longest, true)))] as const
  const shown = styled(curves, mostSeries - 1)
  const left = curves.slice(mostSeries - 1).map(({ name }) => name)
  const middle = Math.floor(trace.time.findIndex((t) => t > 0.3 * trace.time.at(-1)!))
  const markers: MarkerSpec[] =
    middle < 0 ? [] : [{ x: trace.current[middle]!, y: trace.time[middle]!, name: `start of ${motor.tag}` }]
  const { tripMargin, lockedRotor } = start.protection
  const held =
    lockedRotor.margin === null
      ? ''
      : ` With the rotor held the trip comes ${marginText(lockedRotor.margin)} before the permissible time is over.`
  return linePlot({
    ...size,
    title: `${caseOf(figure).tag}: start of ${motor.tag} against its relay and thermal limit`,
    description: `Current of the start up to ${amperes(highest)}; least time to a trip ${marginText(tripMargin)}.${held}`,
    x: {
      label: `current, A (RMS, ${side === 'line' ? 'line side' : 'at the motor'})`,
      domain: [range.from, range.to],
      log: true,
    },
    y: { label: 'time, s', domain: time, log: true },
    series: [{ name: motor.tag, x: trace.current, y: trace.time, style: 0, unnamed: true }, ...shown],
    markers,
    notes: left.length > 0 ? [`not drawn: ${left.join(', ')}`] : [],
  })
}
