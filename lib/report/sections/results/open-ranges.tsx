import type { ReactElement } from 'react'
import { type Range, type VariantRange, variantRanges } from '@/lib/study/variant-ranges'
import { motorTag } from '@/lib/study/words/tags'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import type { ReportContext } from '../../report-context'
import { percent, seconds } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

const between = ({ from, to }: Range, print: (value: number) => string): string => {
  const [low, high] = [print(from), print(to)]
  return low === high ? low : `${low} to ${high}`
}

/** What the records leave open, computed: circuits on one plate, and torque at low voltage. */
export const openRanges = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const say = words.results.ranges
  const rows = computedRuns(runsOf(input, roles)).flatMap(({ record, result }) =>
    variantRanges(result).map((range) => ({ record, range })),
  )
  if (rows.length === 0) return paragraph(paper, say.none, { width })
  const runUp = ({ runUp: range, missed, count }: VariantRange): string =>
    range === null ? say.missed(missed, count) : between(range, (value) => seconds(value))
  const right = 'right' as const
  return [
    ...paragraph(paper, say.intro, { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 34, fixed: true },
        { head: say.heads.motor, width: 40, fixed: true },
        { head: say.heads.what, width: 2.4 },
        { head: say.heads.runUp, width: 1, align: right },
        { head: say.heads.torque, width: 1.2, align: right },
      ],
      rows: rows.map(({ record, range }) => [
        { text: record.tag, weight: 'semibold' as const },
        motorTag(input.document, range.motorId),
        say.kinds[range.kind](range.count),
        runUp(range),
        between(range.leastAccelerating, (value) => percent(value, 1)),
      ]),
    }),
  ]
}
