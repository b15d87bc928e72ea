import type { ReactElement } from 'react'
import { busTag } from '@/lib/study/words/tags'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import { type ReportContext, subsection } from '../../report-context'
import { decimals, percent, seconds } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

/** Flicker and rapid change at the places that limits ask for; nothing where none does. */
export const flickerTable = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const { document } = input
  const say = words.results.flicker
  const rows = computedRuns(runsOf(input, roles)).flatMap(({ record, result }) =>
    (result.flicker ?? []).map((one) => ({ record, one })),
  )
  if (rows.length === 0) return []
  const both = ({ meter, shapeFactor }: { meter: number; shapeFactor: number }): string =>
    `${decimals(meter, 2)} / ${decimals(shapeFactor, 2)}`
  const right = 'right' as const
  return [
    subsection(context, 'results-flicker', say.title),
    ...paragraph(paper, say.intro(document.settings.startsPerHour.text), { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 30, fixed: true },
        { head: say.heads.place, width: 1 },
        { head: say.heads.lamp, width: 0.7 },
        { head: say.heads.starts, width: 1.2, align: right },
        { head: say.heads.settled, width: 0.8, align: right },
        { head: say.heads.largest, width: 0.8, align: right },
        { head: say.heads.above, width: 1, align: right },
        { head: say.heads.shortTerm, width: 1.2, align: right },
        { head: say.heads.longTerm, width: 1.2, align: right },
      ],
      rows: rows.map(({ record, one }) => [
        { text: record.tag, weight: 'semibold' as const },
        busTag(document, one.busId),
        one.lamp,
        `${one.startsIn.tenMinutes} / ${one.startsIn.twoHours}`,
        percent(one.settledChange),
        percent(one.largestChange),
        seconds(one.timeAbove),
        both(one.shortTerm),
        both(one.longTerm),
      ]),
    }),
  ]
}
