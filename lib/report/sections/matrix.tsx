import type { ReactElement } from 'react'
import type { Verdict } from '@/lib/engine/criteria/rule'
import type { LimitRecord } from '@/lib/study/document/limit-record'
import { formatVerdict } from '@/lib/study/words/format-verdict'
import { verdictMeanings, verdictWords } from '@/lib/study/words/verdict-words'
import { block } from '../paper/block'
import { dataTable, type Row } from '../paper/data-table'
import { paintVerdictMark } from '../paper/marks'
import type { Cell } from '../paper/table-cell'
import { caption, paragraph } from '../paper/text-block'
import { chapter, type ReportContext } from '../report-context'
import { colour, small } from '../theme'
import { measure } from '../type/measure'
import { paintText } from '../type/paint-text'
import { roles, runsOf } from '../values/roles'
import { closeMargins, verdictRows } from '../values/verdict-rows'
import { notAssessedTable } from './not-assessed'
import type { Section } from './section'

/** Columns that fit beside one another. */
const columnsAtOnce = 14

const cellOf = (verdict: Verdict | undefined, limit: LimitRecord, { input, words }: ReportContext): Cell => {
  const say = words.verdict.matrix
  if (!verdict) return { text: say.notApplicable, ink: 'soft' }
  if (verdict.word === 'not-assessed') return { text: '', verdict: 'not-assessed' }
  const { value } = formatVerdict(verdict, limit.quantity, closeMargins(input.document))
  const cell: Cell = { text: value ?? say.notReached, verdict: verdict.word }
  return verdict.inUse ? cell : { ...cell, ink: 'soft' }
}

const unitOf = (limit: LimitRecord, { input }: ReportContext): string =>
  formatVerdict({ value: null, limit: 1, word: 'meets' }, limit.quantity, closeMargins(input.document)).unit

const legend = ({ paper, words, width }: ReportContext): ReactElement => {
  const { size } = small
  const { matrix: say } = words.verdict
  const kinds = ['meets', 'close', 'fails', 'not-assessed'] as const
  const leading = 11.5
  const after = 12 + measure(verdictWords['not-assessed'], size, 'semibold') + 8
  const lines = [
    ...kinds.map((kind) => ({ mark: kind, term: verdictWords[kind], meaning: verdictMeanings[kind] })),
    { mark: null, term: say.notApplicable, meaning: say.notApplicableMeaning },
    { mark: null, term: say.grey, meaning: say.greyMeaning },
  ]
  return block(paper, { width, height: lines.length * leading, below: 5 }, (pdf) => {
    for (const [i, { mark, term, meaning }] of lines.entries()) {
      const y = 8.5 + i * leading
      if (mark) paintVerdictMark(pdf, mark, 0, y, size)
      paintText(pdf, term, 12, y, { size, weight: 'semibold', colour: colour(mark ? 'ink' : 'soft') })
      paintText(pdf, meaning, after, y, { size, colour: colour('soft') })
    }
  })
}

/** Every limit against every case, with marks and figures; where a limit is not assessed the reason stands beneath. */
export const matrix: Section = (context) => {
  const { paper, input, words, width } = context
  const say = words.verdict.matrix
  const rows = verdictRows(input.document, input.result.verdicts)
  const found = new Map(rows.map((row) => [`${row.limit.id} ${row.case.id}`, row.verdict]))
  const { limits } = input.document
  const tables: ReactElement[] = []
  for (let from = 0; from < limits.length; from += columnsAtOnce) {
    const shown = limits.slice(from, from + columnsAtOnce)
    const body = roles.flatMap((role): readonly Row[] => {
      const runs = runsOf(input, [role])
      if (runs.length === 0) return []
      return [
        { title: say.roles[role] },
        ...runs.map(({ record }) => [
          { text: record.tag, weight: 'semibold' as const },
          ...shown.map((limit) => cellOf(found.get(`${limit.id} ${record.id}`), limit, context)),
        ]),
      ]
    })
    tables.push(
      dataTable(paper, {
        width,
        size: 6.9,
        leading: 9,
        columns: [
          { head: say.case, width: 30, fixed: true },
          ...shown.map((limit) => ({
            head: `${limit.tag}\n${unitOf(limit, context)}`,
            width: 1,
            align: 'right' as const,
          })),
        ],
        rows: body,
      }),
    )
  }
  const missed = rows.some(({ verdict }) => verdict.word === 'fails' && verdict.value === null)
  return [
    chapter(context, 'matrix', say.title),
    ...paragraph(paper, say.intro, { width }),
    legend(context),
    ...tables,
    ...(missed ? paragraph(paper, say.missed, { width, ...small, ink: 'soft' }) : []),
    ...caption(paper, say.notAssessed, { width, keep: 40 }),
    ...notAssessedTable(context, rows),
  ]
}
