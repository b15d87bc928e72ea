import type { ReactElement } from 'react'
import type { CaseRecord } from '@/lib/study/document/case-records'
import { runningOutcomeSentence } from '@/lib/study/words/outcome-words'
import { motorTag } from '@/lib/study/words/tags'
import { dataTable } from '../../paper/data-table'
import { paragraph } from '../../paper/text-block'
import type { ReportContext } from '../../report-context'
import { current, percent, rpm, seconds } from '../../values/figures'
import { computedRuns, runsOf } from '../../values/roles'

/** How the machines that ran before the start came through it. */
export const runningTable = (
  context: ReportContext,
  wanted: readonly CaseRecord['role'][],
): readonly ReactElement[] => {
  const { paper, input, words, width } = context
  const { running: say } = words.results
  const { document } = input
  const rows = computedRuns(runsOf(input, wanted)).flatMap(({ record, result }) =>
    result.motors.flatMap(({ motorId, running }) => {
      if (!running) return []
      const tag = motorTag(document, motorId)
      const rated = document.plant.motors.find(({ id }) => id === motorId)?.ratedVoltage.si ?? Number.NaN
      const { before, lowestVoltage, lowestSpeed, peakCurrent, outcome } = running
      return [
        [
          { text: record.tag, weight: 'semibold' as const },
          tag,
          percent(before.motorVoltage / rated, 1),
          `${percent(lowestVoltage.voltage / rated, 1)} (${seconds(lowestVoltage.at)})`,
          `${rpm(lowestSpeed.speed)} (${seconds(lowestSpeed.at)})`,
          `${current(peakCurrent.current)} (${seconds(peakCurrent.at)})`,
          rpm(running.settledSpeed),
          {
            text: runningOutcomeSentence(outcome, tag),
            ink:
              outcome.kind === 'rode-through' || outcome.kind === 're-accelerated'
                ? ('ink' as const)
                : ('fails' as const),
          },
        ],
      ]
    }),
  )
  if (rows.length === 0) return paragraph(paper, say.none, { width })
  const right = 'right' as const
  return [
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.case, width: 34, fixed: true },
        { head: say.heads.motor, width: 34, fixed: true },
        { head: say.heads.before, width: 0.8, align: right },
        { head: say.heads.lowest, width: 1.1, align: right },
        { head: say.heads.speed, width: 1.1, align: right },
        { head: say.heads.current, width: 1.1, align: right },
        { head: say.heads.settled, width: 0.8, align: right },
        { head: say.heads.outcome, width: 1.5 },
      ],
      rows,
    }),
  ]
}
