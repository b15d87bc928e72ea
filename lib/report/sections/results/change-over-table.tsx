import type { ReactElement } from 'react'
import { changeOverTargetWords } from '@/lib/study/words/change-over-words'
import { motorTag } from '@/lib/study/words/tags'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import type { ReportContext } from '../../report-context'
import { current, dash, decimals, percent, rpm, seconds } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'
import { supplyPlace } from './start-tables'

/** The state just after each starting device moved on. */
export const changeOverTable = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const { changeOvers: say } = words.results
  const rows = computedRuns(runsOf(input, roles)).flatMap(({ record, result }) => {
    const at = result.places.findIndex(({ busId }) => busId === result.supply?.busId)
    const before = result.places[at]?.before
    return result.changeOvers.map((one) => {
      const voltage = one.busVoltages[at]
      const change = before === undefined || voltage === undefined ? null : (before - voltage) / before
      return [
        { text: record.tag, weight: 'semibold' as const },
        motorTag(input.document, one.motorId),
        changeOverTargetWords[one.to],
        seconds(one.at),
        rpm(one.speed),
        one.to === 'open' ? dash : current(one.state.lineCurrent),
        one.to === 'open' ? dash : decimals(one.state.torque / 1000, 2),
        percent(change),
        one.tooEarly ? { text: say.tooEarly, ink: 'fails' as const } : '',
      ]
    })
  })
  if (rows.length === 0) return paragraph(paper, say.none, { width })
  const right = 'right' as const
  return [
    ...paragraph(paper, say.intro, { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 34, fixed: true },
        { head: say.heads.motor, width: 34, fixed: true },
        { head: say.heads.to, width: 0.8 },
        { head: say.heads.at, width: 0.7, align: right },
        { head: say.heads.speed, width: 0.9, align: right },
        { head: say.heads.lineCurrent, width: 0.8, align: right },
        { head: say.heads.torque, width: 0.9, align: right },
        { head: say.heads.change(supplyPlace(context)), width: 1.1, align: right },
        { head: say.heads.remark, width: 1.9 },
      ],
      rows,
    }),
  ]
}
