import type { ReactElement } from 'react'
import { listedTags } from '@/lib/study/words/list-words'
import { dataTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import type { ReportContext } from '../report-context'
import { dense } from '../theme'
import { measure } from '../type/measure'
import type { RecordField } from '../values/record-field'

interface Tagged {
  tag: string
}

/** Fields that no record of the table fills are left out of its head. */
const filled = <R extends Tagged>(fields: readonly RecordField<R>[], records: readonly R[]) =>
  fields.filter((field) => records.some((record) => field.of(record) !== null))

/** Wide enough for the longest tag within reason. */
const tagColumn = (records: readonly Tagged[]): number =>
  Math.min(110, Math.max(40, ...records.map(({ tag }) => measure(tag, dense.size, 'semibold') + 8)))

/** One row a record, one column a value; for records with few values. */
export const recordRows = <R extends Tagged>(
  { paper, words, width, sources }: ReportContext,
  fields: readonly RecordField<R>[],
  records: readonly R[],
  weights: Readonly<Record<string, number>> = {},
): ReactElement => {
  const used = filled(fields, records)
  return dataTable(paper, {
    width,
    columns: [
      { head: words.records.input.record, width: tagColumn(records), fixed: true },
      ...used.map((field) => ({ head: field.label, width: weights[field.label] ?? 1 })),
    ],
    rows: records.map((record) => [
      { text: record.tag, weight: 'semibold' as const },
      ...used.map((field) => sources.cell(field.of(record), '–')),
    ]),
  })
}

/** So many records at most share a column, so that the head that names them all stays a head. */
const recordsAtOnce = 24

/** Records that differ only in what says which they are, as many as a column holds. */
const alike = <R extends Tagged>(fields: readonly RecordField<R>[], records: readonly R[]): readonly R[][] => {
  const groups = new Map<string, R[]>()
  for (const record of records) {
    const key = JSON.stringify(fields.filter((field) => !field.own).map((field) => field.of(record)))
    groups.set(key, [...(groups.get(key) ?? []), record])
  }
  return [...groups.values()].flatMap((group) =>
    Array.from({ length: Math.ceil(group.length / recordsAtOnce) }, (_, i) =>
      group.slice(i * recordsAtOnce, (i + 1) * recordsAtOnce),
    ),
  )
}

const columnsAtOnce = 4

/** One row a value, one column for all records that are alike; for records with many values. */
export const recordSheets = <R extends Tagged>(
  { paper, words, width, sources }: ReportContext,
  fields: readonly RecordField<R>[],
  records: readonly R[],
): readonly ReactElement[] => {
  const groups = alike(fields, records)
  const tables: ReactElement[] = []
  for (let from = 0; from < groups.length; from += columnsAtOnce) {
    const shown = groups.slice(from, from + columnsAtOnce)
    const used = filled(fields, shown.flat())
    tables.push(
      dataTable(paper, {
        width,
        columns: [
          { head: words.records.input.field, width: 150, fixed: true },
          ...shown.map((group) => ({ head: listedTags(group.map(({ tag }) => tag)), width: 1 })),
        ],
        rows: used.map((field) => [
          { text: field.label, markup: true, ink: 'soft' as const },
          ...shown.map((group) => {
            if (!field.own) return sources.cell(field.of(group[0]!), words.fields.values.silent)
            return listedTags(group.map((record) => field.of(record)?.text ?? '–'))
          }),
        ]),
      }),
    )
  }
  return tables
}

export const noRecords = ({ paper, words, width }: ReportContext): readonly ReactElement[] =>
  paragraph(paper, words.records.input.empty, { width, ink: 'soft' })
