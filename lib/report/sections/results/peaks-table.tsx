import type { ReactElement } from 'react'
import { ratedTorqueOf } from '@/lib/study/to-engine/nameplate-of-motor'
import { motorTag } from '@/lib/study/words/tags'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import { type ReportContext, subsection } from '../../report-context'
import { current, dash, decimals, seconds } from '../../values/figures'
import { computedRuns, roles, runsOf } from '../../values/roles'

/** Peaks of direct starts by the transient model; nothing where no motor starts direct-on-line. */
export const peaksTable = (context: ReportContext): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const { document } = input
  const say = words.results.peaks
  const rows = computedRuns(runsOf(input, roles)).flatMap(({ record, result }) =>
    (result.peaks ?? []).map((one) => ({ record, result, one })),
  )
  if (rows.length === 0) return []
  const right = 'right' as const
  const torqueAt = ({ torque, at }: { torque: number; at: number }) =>
    `${decimals(torque / 1e3, 2)} (${seconds(at, 3)})`
  return [
    subsection(context, 'results-peaks', say.title),
    ...paragraph(paper, say.intro, { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 30, fixed: true },
        { head: say.heads.motor, width: 34, fixed: true },
        { head: say.heads.current, width: 1, align: right },
        { head: say.heads.symmetrical, width: 1, align: right },
        { head: say.heads.torque, width: 1.3, align: right },
        { head: say.heads.rated, width: 0.9, align: right },
        { head: say.heads.lowest, width: 1.3, align: right },
      ],
      rows: rows.map(({ record, result, one }) => {
        const motor = document.plant.motors.find(({ id }) => id === one.motorId)
        const start = result.motors.find(({ motorId }) => motorId === one.motorId)?.start
        const symmetrical = start ? one.peakCurrent.current / (Math.SQRT2 * start.standstill.motorCurrent) : null
        return [
          { text: record.tag, weight: 'semibold' as const },
          motorTag(document, one.motorId),
          current(one.peakCurrent.current),
          decimals(symmetrical, 2),
          torqueAt(one.peakTorque),
          motor ? decimals(one.peakTorque.torque / ratedTorqueOf(motor), 2) : dash,
          torqueAt(one.lowestTorque),
        ]
      }),
    }),
  ]
}
