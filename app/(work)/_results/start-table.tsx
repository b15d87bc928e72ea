import type { StartResult } from '@/lib/engine/case-result'
import type { DirectStartPeaks } from '@/lib/engine/direct-start-peaks'
import { formatNumber } from '@/lib/quantity/format-number'
import { printAnchor, type StartFigure } from '@/lib/study/anchors/anchor'
import type { StudyDocument } from '@/lib/study/document/study-document'
import type { CaseSummary } from '@/lib/study/summary'
import { type Range, type VariantRange, variantRanges } from '@/lib/study/variant-ranges'
import { startOutcomeWords } from '@/lib/study/words/outcome-words'
import { motorTag } from '@/lib/study/words/tags'
import { type FigureRow, FigureTable } from './figure-table'
import * as print from './print'

interface Item {
  peaks: DirectStartPeaks | null
  key: string
  ranges: readonly VariantRange[]
  motorId: string
  /** Which attempt, from 1; null where there was one only. */
  attempt: number | null
  /** Whether it is the start that counts. */
  last: boolean
  start: StartResult
  ratedVoltage: number
}

const { current, energy, orDash, percent, seconds, speed, torque, voltage } = print

const dutyWords = {
  within: 'within its limits',
  exceeded: 'exceeded',
  'not-assessed': 'not assessed: not stated',
  none: '–',
}

/** The start that counts is spoken of; earlier attempts are not. */
const spokenOf =
  (caseId: string, figure: StartFigure) =>
  ({ motorId, last }: Item): string | undefined =>
    last ? printAnchor({ kind: 'start', caseId, motorId, figure }) : undefined

const rowsFor = (document: StudyDocument, caseId: string): readonly FigureRow<Item>[] => [
  { label: 'Outcome', print: ({ start }) => startOutcomeWords[start.outcome.kind] },
  { label: 'Switched on, from the beginning of the schedule', print: ({ start }) => seconds(start.switchedOnAt) },
  {
    label: 'Terminal voltage at standstill',
    print: ({ start, ratedVoltage }) =>
      `${voltage(start.standstill.motorVoltage)}, ${print.perUnit(start.standstill.motorVoltage / ratedVoltage)} of rated`,
  },
  { label: 'Line current at standstill', print: ({ start }) => current(start.standstill.lineCurrent) },
  { label: 'Motor current at standstill', print: ({ start }) => current(start.standstill.motorCurrent) },
  {
    label: 'Power at standstill, line side',
    print: ({ start }) =>
      `${print.activePower(start.standstill.power.re)}, ${print.reactivePower(start.standstill.power.im)}`,
  },
  {
    label: 'Power factor at standstill',
    print: ({ start }) => formatNumber(start.standstill.powerFactor, { decimals: 3 }),
  },
  { label: 'Torque at standstill', print: ({ start }) => torque(start.standstill.torque) },
  {
    label: 'Largest line current',
    anchor: spokenOf(caseId, 'line-current'),
    print: ({ start }) => `${current(start.peakLineCurrent.current)} at ${seconds(start.peakLineCurrent.at)}`,
  },
  {
    label: 'Largest motor current',
    print: ({ start }) => `${current(start.peakMotorCurrent.current)} at ${seconds(start.peakMotorCurrent.at)}`,
  },
  {
    label: 'Lowest terminal voltage',
    print: ({ start, ratedVoltage }) =>
      `${voltage(start.lowestMotorVoltage.voltage)}, ${print.perUnit(start.lowestMotorVoltage.voltage / ratedVoltage)} of rated, at ${seconds(start.lowestMotorVoltage.at)}`,
  },
  {
    label: 'Least accelerating torque to 95 % of rated speed',
    anchor: spokenOf(caseId, 'accelerating-torque'),
    print: ({ start }) =>
      `${torque(start.leastAccelerating.torque)}, ${percent(start.leastAccelerating.ofRated, 1)} of rated, at ${speed(start.leastAccelerating.speed)}`,
  },
  { label: 'Time to 95 % of rated speed, from switching on', print: ({ start }) => orDash(start.timeTo95, seconds) },
  {
    label: `Time to ${document.settings.speedCriterion.text} of rated speed, from switching on`,
    anchor: spokenOf(caseId, 'run-up-time'),
    print: ({ start }) => orDash(start.timeToCriterion, seconds),
  },
  {
    label: 'Starting device, time outside its running position',
    print: ({ start }) => orDash(start.device?.time ?? null, seconds),
  },
  { label: 'Duty of the starting device', print: ({ start }) => dutyWords[start.device?.verdict ?? 'none'] },
  { label: 'Settled speed', print: ({ start }) => orDash(start.settledSpeed, speed) },
  {
    label: 'I²t of the motor current to the speed criterion',
    print: ({ start }) => print.currentSquaredTime(start.i2t),
  },
  { label: 'Rotor slip energy', print: ({ start }) => energy(start.slipEnergy) },
  { label: 'Kinetic energy gained', print: ({ start }) => energy(start.kineticEnergy) },
  {
    label: 'Heat used by current, of I²t over the permissible time',
    print: ({ start }) => orDash(start.heatUsed.byCurrent, (value) => percent(value, 1)),
  },
  {
    label: 'Heat used by the rotor, of locked-rotor power over the permissible time',
    print: ({ start }) => orDash(start.heatUsed.byRotor, (value) => percent(value, 1)),
  },
  {
    label: `Heat used, the larger, ${document.settings.thermalState}`,
    anchor: spokenOf(caseId, 'heat-used'),
    print: ({ start }) => orDash(start.heatUsed.figure, (value) => percent(value, 1)),
  },
]

const between = ({ from, to }: Range, show: (value: number) => string): string =>
  show(from) === show(to) ? show(from) : `${show(from)} to ${show(to)}`

const rangeText = (range: VariantRange | undefined): string => {
  if (!range) return '–'
  const time =
    range.runUp === null
      ? `speed not reached with ${range.missed} of ${range.count}`
      : `run-up ${between(range.runUp, seconds)}`
  return `${time}, least torque ${between(range.leastAccelerating, (value) => percent(value, 1))}`
}

const rangeRows: readonly FigureRow<Item>[] = [
  {
    label: 'Over all circuits that meet the nameplate',
    print: ({ ranges }) => rangeText(ranges.find(({ kind }) => kind === 'same-plate')),
  },
  {
    label: 'With torque ∝ U^2.25 below rated voltage',
    print: ({ ranges }) => rangeText(ranges.find(({ kind }) => kind === 'low-voltage-torque')),
  },
]

const peakRows: readonly FigureRow<Item>[] = [
  {
    label: 'Largest instantaneous current, worst phase and instant, transient model',
    print: ({ peaks }) => (peaks ? `${current(peaks.peakCurrent.current)} peak` : '–'),
  },
  {
    label: 'Greatest torque after switching on, transient model',
    print: ({ peaks }) => (peaks ? `${torque(peaks.peakTorque.torque)} at ${seconds(peaks.peakTorque.at)}` : '–'),
  },
  {
    label: 'Least torque after switching on, transient model',
    print: ({ peaks }) => (peaks ? `${torque(peaks.lowestTorque.torque)} at ${seconds(peaks.lowestTorque.at)}` : '–'),
  },
]

/** Everything about the motors that are started in the case. */
export function StartTable({ document, result }: { document: StudyDocument; result: CaseSummary }) {
  const items = result.motors.flatMap(({ motorId, start, earlierAttempts }): Item[] => {
    const ratedVoltage = document.plant.motors.find(({ id }) => id === motorId)?.ratedVoltage.si ?? Number.NaN
    const all = [...(earlierAttempts ?? []), ...(start ? [start] : [])]
    const ranges = variantRanges(result).filter((range) => range.motorId === motorId)
    return all.map((each, i) => ({
      key: `${motorId}-${i}`,
      motorId,
      attempt: all.length > 1 ? i + 1 : null,
      last: i === all.length - 1 && start !== null,
      start: each,
      ratedVoltage,
      // Variants tell of the last attempt.
      ranges: i === all.length - 1 ? ranges : [],
      peaks: i === 0 ? (result.peaks?.find((one) => one.motorId === motorId) ?? null) : null,
    }))
  })
  return (
    <FigureTable
      caption="Starting motors"
      items={items}
      itemId={({ key }) => key}
      name={({ motorId, attempt }) => `${motorTag(document, motorId)}${attempt === null ? '' : `, attempt ${attempt}`}`}
      rows={[
        ...rowsFor(document, result.caseId),
        ...(items.some(({ ranges }) => ranges.length > 0) ? rangeRows : []),
        ...(items.some(({ peaks }) => peaks) ? peakRows : []),
      ]}
    />
  )
}
