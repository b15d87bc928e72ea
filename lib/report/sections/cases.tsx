import { caseSentence } from '@/lib/study/words/case-sentence'
import { caseOutcomeSentence, startOutcomeSentence } from '@/lib/study/words/outcome-words'
import { busTag, motorTag } from '@/lib/study/words/tags'
import { dataTable, type Row } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { chapter, type ReportContext } from '../report-context'
import { type CaseRun, roles, runsOf } from '../values/roles'
import type { Section } from './section'

/** How a case ended: the case where it has no run, otherwise each start. */
const outcome = ({ result }: CaseRun, { input }: ReportContext): string => {
  const { document } = input
  if (!result) return '–'
  if (result.outcome.kind !== 'complete') return caseOutcomeSentence(result.outcome, (id) => busTag(document, id))
  return result.motors
    .flatMap(({ motorId, start }) => (start ? [startOutcomeSentence(start.outcome, motorTag(document, motorId))] : []))
    .join(' ')
}

const sentence = ({ record }: CaseRun, { input }: ReportContext): string => {
  const words = `${caseSentence(record, input.document)}.`
  return record.reason.trim() === '' ? words : `${words} ${record.reason}`
}

/** Every case in a sentence, with how it ended. */
export const cases: Section = (context) => {
  const { paper, input, words, width } = context
  const { cases: say } = words.records
  const rows = roles.flatMap((role): readonly Row[] => {
    const runs = runsOf(input, [role])
    if (runs.length === 0) return []
    return [
      { title: say.roles[role] },
      ...runs.map((run) => [
        { text: run.record.tag, weight: 'semibold' as const },
        sentence(run, context),
        outcome(run, context),
      ]),
    ]
  })
  return [
    chapter(context, 'cases', say.title),
    ...paragraph(paper, say.intro, { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.tag, width: 34, fixed: true },
        { head: say.heads.sentence, width: 1.7 },
        { head: say.heads.outcome, width: 1 },
      ],
      rows,
    }),
  ]
}
