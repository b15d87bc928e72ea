import type { CaseFigure } from '@/lib/drawing/case-figure'
import { currentPlot } from '@/lib/drawing/current-plot'
import { frequencyPlot } from '@/lib/drawing/frequency-plot'
import { speedPlot } from '@/lib/drawing/speed-plot'
import { timeCurrentPlot } from '@/lib/drawing/time-current-plot'
import { torqueSpeedPlot } from '@/lib/drawing/torque-speed-plot'
import { transientPlots } from '@/lib/drawing/transient-plots'
import { voltagePlot } from '@/lib/drawing/voltage-plot'
import { busTag, motorTag } from '@/lib/study/words/tags'
import { radianPerSecond } from '@/lib/units/si'
import { toRpm } from '@/lib/units/speed'
import { Figure } from './figure'
import { sampledTable, type TableCurve } from './sampled-table'

/** Two beside each other on a usual screen; the type in them stays readable. */
const size = { width: 125, height: 78 }

const timeAxis = ({ result }: CaseFigure): TableCurve => ({
  head: 'Time from the first switching-on, s',
  values: result.series.time,
  decimals: 3,
})

const rpm = (values: readonly number[] = []): number[] => values.map((value) => toRpm(radianPerSecond(value)))

/** Buses that limits are set for, and the terminals of what starts: the places that a reader looks at first. */
const placesToDraw = ({ document, result, verdicts }: CaseFigure): readonly string[] => {
  const limited = document.limits.flatMap(({ place }) => (place.kind === 'bus' ? [place.bus] : []))
  const terminals = result.motors
    .filter(({ start }) => start)
    .map(({ motorId }) => document.plant.motors.find(({ id }) => id === motorId)?.bus ?? '')
  const judged = verdicts.flatMap(({ caseId, busId }) => (caseId === result.caseId && busId ? [busId] : []))
  const present = new Set(result.places.map(({ busId }) => busId))
  return [...new Set([...limited, ...terminals, ...judged])].filter((id) => present.has(id))
}

function VoltageFigure({ figure, busId }: { figure: CaseFigure; busId: string }) {
  const nominal = figure.document.plant.buses.find(({ id }) => id === busId)?.nominal.si ?? Number.NaN
  const values = (figure.result.series.busVoltage[busId] ?? []).map((value) => (100 * value) / nominal)
  const curve = { head: `${busTag(figure.document, busId)}, % of nominal`, values, decimals: 2 }
  return (
    <Figure
      scene={voltagePlot(figure, { ...size, busIds: [busId] })}
      table={sampledTable(timeAxis(figure), [curve])}
      anchor={`series/${figure.result.caseId}/voltage/${busId}`}
    />
  )
}

const startedIds = ({ result }: CaseFigure): readonly string[] =>
  result.motors.filter(({ start }) => start).map(({ motorId }) => motorId)

/** The curves of what starts are spoken of by the first motor. */
const curveAnchor = (figure: CaseFigure, curve: 'speed' | 'current'): string =>
  `series/${figure.result.caseId}/${curve}/${startedIds(figure)[0] ?? ''}`

function SpeedFigure({ figure }: { figure: CaseFigure }) {
  const curves = startedIds(figure).map((id) => ({
    head: `${motorTag(figure.document, id)}, r/min`,
    values: rpm(figure.result.series.motors[id]?.speed),
    decimals: 1,
  }))
  return (
    <Figure
      scene={speedPlot(figure, size)}
      table={sampledTable(timeAxis(figure), curves)}
      anchor={curveAnchor(figure, 'speed')}
    />
  )
}

function CurrentFigure({ figure }: { figure: CaseFigure }) {
  const curves = startedIds(figure).flatMap((id) => {
    const series = figure.result.series.motors[id]
    const tag = motorTag(figure.document, id)
    return [
      { head: `${tag} line current, A`, values: series?.lineCurrent ?? [], decimals: 1 },
      { head: `${tag} motor current, A`, values: series?.motorCurrent ?? [], decimals: 1 },
    ]
  })
  return (
    <Figure
      scene={currentPlot(figure, size)}
      table={sampledTable(timeAxis(figure), curves)}
      anchor={curveAnchor(figure, 'current')}
    />
  )
}

function TorqueFigure({ figure, motorId }: { figure: CaseFigure; motorId: string }) {
  const series = figure.result.series.motors[motorId]
  const axis = { head: 'Speed, r/min', values: rpm(series?.speed), decimals: 1 }
  const kilo = (values: readonly number[] = []) => values.map((value) => value / 1000)
  const curves = [
    { head: 'Motor torque at its actual voltage, kN·m', values: kilo(series?.torque), decimals: 3 },
    { head: 'Load torque, kN·m', values: kilo(series?.loadTorque), decimals: 3 },
  ]
  return <Figure scene={torqueSpeedPlot(figure, { ...size, motorId })} table={sampledTable(axis, curves)} />
}

/** The start against relay and thermal limit, logarithmic in both; nothing where no relay is stated. */
function TimeCurrentFigure({ figure, motorId }: { figure: CaseFigure; motorId: string }) {
  const scene = timeCurrentPlot(figure, { ...size, height: 95, motorId })
  if (scene === null) return null
  const series = figure.result.series.motors[motorId]
  const curves = [
    { head: 'Line current, A', values: series?.lineCurrent ?? [], decimals: 1 },
    { head: 'Motor current, A', values: series?.motorCurrent ?? [], decimals: 1 },
  ]
  return <Figure scene={scene} table={sampledTable(timeAxis(figure), curves)} />
}

/** First periods and envelopes of a start by the fifth-order model. */
function TransientFigures({ figure }: { figure: CaseFigure }) {
  const { transient } = figure.result.series
  if (!transient) return null
  const { time, current, peak, torque, torqueLow, torqueHigh, opening } = transient
  const axis = (values: readonly number[]) => ({ head: 'Time from the first switching-on, s', values, decimals: 3 })
  const ampere = (head: string, values: readonly number[]) => ({ head: `${head}, A`, values, decimals: 1 })
  const kilo = (head: string, values: readonly number[]) => ({
    head: `${head}, kN·m`,
    values: values.map((value) => value / 1000),
    decimals: 3,
  })
  const tables = [
    sampledTable(axis(opening.time), [ampere('Current of phase a', opening.current)]),
    sampledTable(axis(opening.time), [kilo('Torque', opening.torque)]),
    sampledTable(axis(time), [ampere('RMS over half a period', current), ampere('Peak', peak)]),
    sampledTable(axis(time), [kilo('Mean', torque), kilo('Least', torqueLow), kilo('Greatest', torqueHigh)]),
  ]
  return transientPlots(figure, size).map((scene, i) => <Figure key={scene.title} scene={scene} table={tables[i]!} />)
}

function FrequencyFigure({ figure }: { figure: CaseFigure }) {
  const scene = frequencyPlot(figure, size)
  const values = figure.result.series.generator?.frequency
  if (!scene || !values) return null
  return (
    <Figure scene={scene} table={sampledTable(timeAxis(figure), [{ head: 'Frequency, Hz', values, decimals: 3 }])} />
  )
}

/** All figures of a case. */
export function CasePlots({ figure }: { figure: CaseFigure }) {
  return (
    <div className="grid grid-cols-1 gap-3 xl:grid-cols-2">
      {placesToDraw(figure).map((busId) => (
        <VoltageFigure key={busId} figure={figure} busId={busId} />
      ))}
      <FrequencyFigure figure={figure} />
      {startedIds(figure).length > 0 ? (
        <>
          <SpeedFigure figure={figure} />
          <CurrentFigure figure={figure} />
        </>
      ) : null}
      {startedIds(figure).map((motorId) => (
        <TimeCurrentFigure key={`${motorId} relay`} figure={figure} motorId={motorId} />
      ))}
      {startedIds(figure).map((motorId) => (
        <TorqueFigure key={motorId} figure={figure} motorId={motorId} />
      ))}
      <TransientFigures figure={figure} />
    </div>
  )
}
