import type { ReactElement } from 'react'
import type { CaseResult, MotorResult, StartResult } from '@/lib/engine/case-result'
import type { CaseRecord } from '@/lib/study/document/case-records'
import { startOutcomeWords } from '@/lib/study/words/outcome-words'
import { busTag, motorTag } from '@/lib/study/words/tags'
import { dataTable, type Row } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import type { ReportContext } from '../../report-context'
import { small } from '../../theme'
import { current, dash, decimals, percent, rpm, seconds } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

interface Start {
  record: CaseRecord
  /** Which attempt, from 1; null where there was one only. */
  attempt: number | null
  result: CaseResult
  motor: MotorResult
  start: StartResult
}

/** One row a start, under the role of its case. */
const byRole = (context: ReportContext, row: (start: Start) => Row): readonly Row[] =>
  roles.flatMap((role): readonly Row[] => {
    const starts = computedRuns(runsOf(context.input, [role])).flatMap(({ record, result }) =>
      result.motors.flatMap((motor) => {
        const all = [...(motor.earlierAttempts ?? []), ...(motor.start ? [motor.start] : [])]
        return all.map((start, i) => ({ record, result, motor, start, attempt: all.length > 1 ? i + 1 : null }))
      }),
    )
    return starts.length === 0 ? [] : [{ title: context.words.records.cases.roles[role] }, ...starts.map(row)]
  })

const ratedVoltage = ({ input }: ReportContext, motorId: string): number =>
  input.document.plant.motors.find(({ id }) => id === motorId)?.ratedVoltage.si ?? Number.NaN

/** Deepest change at the bus of the supply, in parts of the voltage before. */
export const changeAtSupply = ({ places, supply }: CaseResult): number | null => {
  const place = places.find(({ busId }) => busId === supply?.busId)
  return place ? (place.before - place.deepest.voltage) / place.before : null
}

/** The tag of the supply's bus where all cases share it. */
export const supplyPlace = ({ input, words }: ReportContext): string => {
  const buses = new Set(input.result.cases.flatMap(({ supply }) => (supply ? [supply.busId] : [])))
  const only = buses.size === 1 ? [...buses][0] : undefined
  return only === undefined ? words.results.supplyBus : busTag(input.document, only)
}

/** The motor of a start, with its attempt where there were several. */
const whose = ({ motor, attempt }: Start, { input }: ReportContext): string =>
  motorTag(input.document, motor.motorId) + (attempt === null ? '' : ` · ${attempt}`)

const title = ({ record }: Start) => ({ text: record.tag, weight: 'semibold' as const })

export const startTable = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const { heads, note } = words.results.starts
  const right = 'right' as const
  const rows = byRole(context, (one) => {
    const { result, motor, start } = one
    const { standstill, leastAccelerating, outcome } = start
    return [
      title(one),
      whose(one, context),
      startOutcomeWords[outcome.kind],
      percent(changeAtSupply(result)),
      percent(standstill.motorVoltage / ratedVoltage(context, motor.motorId), 1),
      current(standstill.lineCurrent),
      current(standstill.motorCurrent),
      decimals(standstill.powerFactor, 3),
      seconds(start.timeTo95),
      seconds(start.timeToCriterion),
      outcome.kind === 'started' ? seconds(outcome.at) : dash,
      `${percent(leastAccelerating.ofRated, 1)} (${rpm(leastAccelerating.speed)})`,
      percent(start.heatUsed.figure, 1),
    ]
  })
  return [
    ...paragraph(paper, note, { width, ...small, ink: 'soft' }),
    dataTable(paper, {
      width,
      size: 7.2,
      columns: [
        { head: heads.case, width: 27, fixed: true },
        { head: heads.motor, width: 27, fixed: true },
        { head: heads.outcome, width: 1.3 },
        { head: heads.change(supplyPlace(context)), width: 1.1, align: right },
        { head: heads.motorVoltage, width: 1.1, align: right },
        { head: heads.lineCurrent, width: 0.9, align: right },
        { head: heads.motorCurrent, width: 0.9, align: right },
        { head: heads.powerFactor, width: 0.75, align: right },
        { head: heads.time95, width: 0.8, align: right },
        { head: heads.criterion(input.document.settings.speedCriterion.text), width: 0.8, align: right },
        { head: heads.position, width: 1, align: right },
        { head: heads.torque, width: 1.35, align: right },
        { head: heads.heat, width: 0.75, align: right },
      ],
      rows,
    }),
  ]
}

export const energyTable = (context: ReportContext): ReactElement => {
  const { paper, words, width } = context
  const { energyHeads: heads } = words.results.starts
  const right = 'right' as const
  const at = (figure: string, time: number) => `${figure} (${seconds(time)})`
  const rows = byRole(context, (one) => {
    const { motor, start } = one
    const { peakLineCurrent, peakMotorCurrent, lowestMotorVoltage, heatUsed } = start
    const lowest = lowestMotorVoltage.voltage / ratedVoltage(context, motor.motorId)
    return [
      title(one),
      whose(one, context),
      at(current(peakLineCurrent.current), peakLineCurrent.at),
      at(current(peakMotorCurrent.current), peakMotorCurrent.at),
      at(percent(lowest, 1), lowestMotorVoltage.at),
      decimals(start.i2t / 1e6, 4),
      decimals(start.slipEnergy / 1e6, 3),
      decimals(start.kineticEnergy / 1e6, 3),
      percent(heatUsed.byCurrent, 1),
      percent(heatUsed.byRotor, 1),
      rpm(start.settledSpeed),
    ]
  })
  return dataTable(paper, {
    width,
    size: 7.2,
    columns: [
      { head: heads.case, width: 27, fixed: true },
      { head: heads.motor, width: 27, fixed: true },
      { head: heads.peakLine, width: 1.2, align: right },
      { head: heads.peakMotor, width: 1.2, align: right },
      { head: heads.lowest, width: 1.3, align: right },
      { head: heads.i2t, width: 0.9, align: right },
      { head: heads.slipEnergy, width: 0.9, align: right },
      { head: heads.kinetic, width: 0.9, align: right },
      { head: heads.byCurrent, width: 0.9, align: right },
      { head: heads.byRotor, width: 0.9, align: right },
      { head: heads.settled, width: 0.9, align: right },
    ],
    rows,
  })
}
