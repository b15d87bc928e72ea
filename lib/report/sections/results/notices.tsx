import type { ReactElement } from 'react'
import { listedTags } from '@/lib/study/words/list-words'
import { noticeSentence } from '@/lib/study/words/notice-words'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import type { ReportContext } from '../../report-context'
import { computedRuns, roles, runsOf } from '../../values/roles'

/** What the calculation noticed; cases with the same sentence share a row. */
export const notices = ({ paper, input, words, width }: ReportContext): readonly ReactElement[] => {
  const { notices: say } = words.results
  const bySentence = new Map<string, string[]>()
  for (const { record, result } of computedRuns(runsOf(input, roles))) {
    for (const notice of result.notices) {
      const sentence = noticeSentence(notice, input.document)
      bySentence.set(sentence, [...(bySentence.get(sentence) ?? []), record.tag])
    }
  }
  if (bySentence.size === 0) return paragraph(paper, say.none, { width })
  return [
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 90, fixed: true },
        { head: say.heads.notice, width: 1 },
      ],
      rows: [...bySentence].map(([sentence, tags]) => [
        { text: listedTags(tags), weight: 'semibold' as const },
        sentence,
      ]),
    }),
  ]
}
