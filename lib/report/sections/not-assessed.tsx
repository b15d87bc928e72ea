import type { ReactElement } from 'react'
import { listedTags } from '@/lib/study/words/list-words'
import { notAssessedReasons } from '@/lib/study/words/verdict-words'
import { dataTable } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import type { ReportContext } from '../report-context'
import { small } from '../theme'
import type { VerdictRow } from '../values/verdict-rows'

/** Why limits have no verdict; limits that lack it for the same reason in the same case share a row. */
export const notAssessedTable = (
  { paper, words, width }: ReportContext,
  rows: readonly VerdictRow[],
): readonly ReactElement[] => {
  const say = words.verdict.matrix
  const groups = new Map<string, { tag: string; limits: string[]; reason: string }>()
  for (const { verdict, limit, case: one } of rows) {
    if (verdict.word !== 'not-assessed') continue
    const reason = verdict.reason === null ? '' : notAssessedReasons[verdict.reason]
    const key = `${one.id} ${reason}`
    const group = groups.get(key) ?? { tag: one.tag, limits: [], reason }
    group.limits.push(limit.tag)
    groups.set(key, group)
  }
  if (groups.size === 0) return paragraph(paper, say.allAssessed, { width, ...small })
  return [
    dataTable(paper, {
      width,
      columns: [
        { head: say.reasonHeads.case, width: 60, fixed: true },
        { head: say.reasonHeads.limit, width: 110, fixed: true },
        { head: say.reasonHeads.reason, width: 1 },
      ],
      rows: [...groups.values()].map(({ tag, limits, reason }) => [
        { text: tag, weight: 'semibold' as const },
        listedTags(limits),
        reason,
      ]),
    }),
  ]
}
