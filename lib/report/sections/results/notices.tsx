import type { ReactElement } from 'react'
import { listedTags } from '@/lib/study/words/list-words'
import { noticeSentence } from '@/lib/study/words/notice-words'
import { motorTag } from '@/lib/study/words/tags'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import type { ReportContext } from '../../report-context'
import { percent } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

interface Noticed {
  tags: string[]
  sentence: string
}

/** Starts of one motor at several reduced voltages are one sentence with their range. */
const reducedVoltage = ({ input, words }: ReportContext): readonly Noticed[] => {
  const byMotor = new Map<string, { tags: string[]; voltages: number[] }>()
  for (const { record, result } of computedRuns(runsOf(input, roles))) {
    for (const notice of result.notices) {
      if (notice.kind !== 'reduced-voltage-torque') continue
      const found = byMotor.get(notice.motorId) ?? { tags: [], voltages: [] }
      found.tags.push(record.tag)
      found.voltages.push(notice.voltage)
      byMotor.set(notice.motorId, found)
    }
  }
  return [...byMotor].map(([motorId, { tags, voltages }]) => {
    const [low, high] = [Math.min(...voltages), Math.max(...voltages)].map((value) => percent(value, 1))
    const range = low === high ? `${low}` : words.results.notices.range(low ?? '', high ?? '')
    return { tags, sentence: words.results.notices.reducedVoltage(motorTag(input.document, motorId), range) }
  })
}

const others = ({ input }: ReportContext): readonly Noticed[] => {
  const bySentence = new Map<string, string[]>()
  for (const { record, result } of computedRuns(runsOf(input, roles))) {
    for (const notice of result.notices) {
      if (notice.kind === 'reduced-voltage-torque') continue
      const sentence = noticeSentence(notice, input.document)
      bySentence.set(sentence, [...(bySentence.get(sentence) ?? []), record.tag])
    }
  }
  return [...bySentence].map(([sentence, tags]) => ({ tags, sentence }))
}

/** What the calculation noticed; cases with the same sentence share a row. */
export const notices = (context: ReportContext): readonly ReactElement[] => {
  const { paper, words, width } = context
  const { notices: say } = words.results
  const all = [...reducedVoltage(context), ...others(context)]
  if (all.length === 0) return paragraph(paper, say.none, { width })
  return [
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 110, fixed: true },
        { head: say.heads.notice, width: 1 },
      ],
      rows: all.map(({ tags, sentence }) => [
        { text: listedTags([...new Set(tags)]), weight: 'semibold' as const },
        sentence,
      ]),
    }),
  ]
}
