import type { CaseSeries } from '../engine/case-result'
import type { StudyDocument } from '../study/document/study-document'
import type { StudySummary } from '../study/summary'
import { caseOutcomeSentence } from '../study/words/outcome-words'
import { busTag, caseTag } from '../study/words/tags'
import { csvText, type Table } from './csv-text'
import { changeOverTable, protectionTable, runningTable, startTable } from './motor-tables'
import { placeTable } from './place-table'
import { seriesTable } from './series-table'
import { verdictTable } from './verdict-table'

/** A file to be written: its name with ending, and its text. */
export interface CsvFile {
  name: string
  text: string
}

export interface CsvOptions {
  /** For spreadsheets that take a text without the mark for another encoding; off for programs. */
  byteOrderMark?: boolean
}

const caseTable = (document: StudyDocument, { cases }: StudySummary): Table => ({
  name: 'cases',
  heads: ['case', 'role', 'outcome', 'reason'],
  rows: cases.map(({ caseId, outcome }) => {
    const record = document.cases.find(({ id }) => id === caseId)
    return [
      caseTag(document, caseId),
      record?.role ?? null,
      caseOutcomeSentence(outcome, (id) => busTag(document, id)),
      record?.reason ?? null,
    ]
  }),
})

const file = (table: Table, { byteOrderMark = false }: CsvOptions): CsvFile => ({
  name: `${table.name}.csv`,
  text: csvText(table, byteOrderMark),
})

/** The results of a study as tables: cases, voltages, starts, protection, running machines, change-overs, limits. Tables without a row are left out. */
export const resultsCsv = (
  document: StudyDocument,
  results: StudySummary,
  options: CsvOptions = {},
): readonly CsvFile[] =>
  [
    caseTable(document, results),
    placeTable(document, results.cases),
    startTable(document, results.cases),
    protectionTable(document, results.cases),
    runningTable(document, results.cases),
    changeOverTable(document, results.cases),
    verdictTable(document, results.verdicts),
  ]
    .filter(({ rows }) => rows.length > 0)
    .map((table) => file(table, options))

/** The curves of one case as a table, `run-<identity of the case>.csv`. */
export const seriesCsv = (
  document: StudyDocument,
  caseId: string,
  series: CaseSeries,
  options: CsvOptions = {},
): CsvFile => file(seriesTable(document, caseId, series), options)
