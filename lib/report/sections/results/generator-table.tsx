import type { ReactElement } from 'react'
import { generatorOutcomeWords } from '@/lib/study/words/generator-words'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import { type ReportContext, subsection } from '../../report-context'
import { dash, decimals, percent, seconds } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

/** Dip and frequency of the generator of each case that has one; nothing where none does. */
export const generatorTable = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const say = words.results.generator
  const runs = computedRuns(runsOf(input, roles)).flatMap(({ record, result: { generator } }) =>
    generator ? [{ record, generator }] : [],
  )
  if (runs.length === 0) return []
  const right = 'right' as const
  return [
    subsection(context, 'results-generator', say.title),
    ...paragraph(paper, say.intro, { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 30, fixed: true },
        { head: say.heads.outcome, width: 1.4 },
        { head: say.heads.first, width: 0.8, align: right },
        { head: say.heads.lowest, width: 1, align: right },
        { head: say.heads.sustained, width: 0.8, align: right },
        { head: say.heads.lowestFrequency, width: 1, align: right },
        { head: say.heads.settledFrequency, width: 0.8, align: right },
        { head: say.heads.power, width: 0.9, align: right },
        { head: say.heads.ceiling, width: 0.8, align: right },
      ],
      rows: runs.map(({ record, generator }) => {
        const { held, first, lowest, sustained, lowestFrequency, settledFrequency, largestPower } = generator
        const dip = (value: number | null) => (value === null ? dash : percent((held - value) / held))
        return [
          { text: record.tag, weight: 'semibold' as const },
          generatorOutcomeWords[generator.outcome],
          dip(first),
          `${dip(lowest.voltage)} (${seconds(lowest.at)})`,
          dip(sustained),
          `${decimals(lowestFrequency.frequency, 2)} (${seconds(lowestFrequency.at)})`,
          settledFrequency === null ? dash : decimals(settledFrequency, 2),
          decimals(largestPower.power / 1e3, 1),
          seconds(generator.atCeiling),
        ]
      }),
    }),
  ]
}
