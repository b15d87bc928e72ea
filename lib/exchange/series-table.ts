import type { CaseSeries } from '../engine/case-result'
import type { StudyDocument } from '../study/document/study-document'
import { busTag, motorTag } from '../study/words/tags'
import type { Cell, Table } from './csv-text'

interface Column {
  head: string
  values: readonly number[]
  /** Exported figure of one in SI. */
  factor: number
}

const rpm = 30 / Math.PI

/** The sampled run of one case, one row an instant; two rows at one instant are before and after a switching. */
export const seriesTable = (document: StudyDocument, caseId: string, series: CaseSeries): Table => {
  const columns: readonly Column[] = [
    { head: 'time, s', values: series.time, factor: 1 },
    ...Object.entries(series.busVoltage).map(([busId, values]) => ({
      head: `${busTag(document, busId)} voltage, kV`,
      values,
      factor: 1e-3,
    })),
    ...Object.entries(series.motors).flatMap(([motorId, motor]) => {
      const of = (what: string, values: readonly number[], factor: number): Column => ({
        head: `${motorTag(document, motorId)} ${what}`,
        values,
        factor,
      })
      return [
        of('speed, r/min', motor.speed, rpm),
        of('torque, N·m', motor.torque, 1),
        of('load torque, N·m', motor.loadTorque, 1),
        of('line current, A', motor.lineCurrent, 1),
        of('motor current, A', motor.motorCurrent, 1),
        of('motor voltage, kV', motor.motorVoltage, 1e-3),
        of('active power, kW', motor.activePower, 1e-3),
        of('reactive power, kvar', motor.reactivePower, 1e-3),
      ]
    }),
  ]
  return {
    name: `run-${caseId}`,
    heads: columns.map(({ head }) => head),
    rows: series.time.map((_, i) =>
      columns.map(({ values, factor }): Cell => {
        const value = values[i]
        return value === undefined ? null : value * factor
      }),
    ),
  }
}
