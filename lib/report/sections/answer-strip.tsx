import type { ReactElement } from 'react'
import { printQuantity } from '@/lib/quantity/print-quantity'
import { busTag, motorTag } from '@/lib/study/words/tags'
import { block } from '../paper/block'
import type { ReportContext } from '../report-context'
import { colour } from '../theme'
import { paintLine, paintText } from '../type/paint-text'
import { plain, wrapRuns } from '../type/rich-text'
import { current, rpm, withPercent, withSeconds } from '../values/figures'
import type { VerdictRow } from '../values/verdict-rows'

interface Answer {
  label: string
  value: string
  detail: string
}

/** The figures that a reader checks first, from the case of the governing limit. */
const answers = ({ input, words }: ReportContext, row: VerdictRow): readonly Answer[] => {
  const { document, result } = input
  const { verdict } = words
  const run = result.cases.find(({ caseId }) => caseId === row.case.id)
  const motor =
    run?.motors.find((one) => one.motorId === row.verdict.motorId && one.start) ?? run?.motors.find((one) => one.start)
  const start = motor?.start
  const record = document.plant.motors.find(({ id }) => id === motor?.motorId)
  if (!run || !start || !record) return []
  const place = run.places.find(({ busId }) => busId === (row.verdict.busId ?? run.supply?.busId))
  const tag = motorTag(document, record.id)
  const { standstill, leastAccelerating, heatUsed } = start
  return [
    ...(place
      ? [
          {
            label: verdict.answerNames.deepest(busTag(document, place.busId)),
            value: withPercent((place.before - place.deepest.voltage) / place.before),
            detail: `${verdict.ofBefore}, ${verdict.atTime(withSeconds(place.deepest.at))}`,
          },
        ]
      : []),
    {
      label: `${tag}: ${verdict.answerNames.standstillVoltage}`,
      value: withPercent(standstill.motorVoltage / record.ratedVoltage.si, 1),
      detail: `${printQuantity(standstill.motorVoltage, 'voltage', { digits: 4 })}, ${verdict.ofRated}`,
    },
    {
      label: `${tag}: ${verdict.answerNames.currents}`,
      value: `${current(standstill.lineCurrent)} / ${current(standstill.motorCurrent)}\u2009A`,
      detail: `PF ${standstill.powerFactor.toFixed(3)}`,
    },
    {
      label: `${tag}: ${verdict.answerNames.torque}`,
      value: withPercent(leastAccelerating.ofRated, 1),
      detail: `${verdict.ofRated}, ${verdict.atSpeed(`${rpm(leastAccelerating.speed)}\u2009r/min`)}`,
    },
    {
      label: `${tag}: ${verdict.answerNames.runUp}`,
      value: start.timeToCriterion === null ? verdict.notReached : withSeconds(start.timeToCriterion),
      detail: start.outcome.kind === 'started' ? verdict.inPosition(withSeconds(start.outcome.at)) : verdict.notReached,
    },
    {
      label: `${tag}: ${verdict.answerNames.heat}`,
      value: heatUsed.figure === null ? verdict.notDeclared : withPercent(heatUsed.figure, 1),
      detail: heatUsed.state === null ? '' : verdict.ofPermissible(heatUsed.state),
    },
  ]
}

export const answerStrip = (context: ReportContext, row: VerdictRow): readonly ReactElement[] => {
  const { paper, width, words } = context
  const all = answers(context, row)
  if (all.length === 0) return []
  const columns = 3
  const cell = width / columns
  const laid = all.map((answer) => ({
    ...answer,
    lines: wrapRuns(plain(answer.label), cell - 10, 7.4),
    details: wrapRuns(plain(answer.detail), cell - 10, 7.4),
  }))
  const rowHeight = 50
  const height = 14 + Math.ceil(laid.length / columns) * rowHeight
  const caption = `${words.verdict.answers} ${row.case.tag}`
  return [
    block(paper, { width, height, below: 2 }, (pdf) => {
      paintText(pdf, caption, 0, 8, { size: 7.6, weight: 'semibold', colour: colour('soft') })
      for (const [i, { lines, value, details }] of laid.entries()) {
        const x = (i % columns) * cell
        const y = 14 + Math.floor(i / columns) * rowHeight
        pdf
          .lineWidth(0.4)
          .moveTo(x, y)
          .lineTo(x + cell - 8, y)
          .stroke(colour('rule'))
        for (const [k, line] of lines.entries())
          paintLine(pdf, line, x, y + 9 + k * 9, { size: 7.4, colour: colour('soft') })
        const top = y + 9 + lines.length * 9
        paintText(pdf, value, x, top + 6, { size: 12, weight: 'semibold', colour: colour('ink') })
        for (const [k, line] of details.entries())
          paintLine(pdf, line, x, top + 16 + k * 9, { size: 7.4, colour: colour('soft') })
      }
    }),
  ]
}
