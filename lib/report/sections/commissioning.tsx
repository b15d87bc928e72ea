import type { CaseResult, MotorResult, StartResult } from '@/lib/engine/case-result'
import type { CaseRecord } from '@/lib/study/document/case-records'
import { busTag, motorTag } from '@/lib/study/words/tags'
import { dataTable, type Row } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { chapter, type ReportContext } from '../report-context'
import { current, rpm, volts, withSeconds } from '../values/figures'
import { computedRuns, runsOf } from '../values/roles'
import type { Section } from './section'

interface Start {
  record: CaseRecord
  result: CaseResult
  motor: MotorResult
  start: StartResult
}

/** Buses of a case that a limit names, and that of the supply. */
const watched = ({ result }: Start, { input }: ReportContext) => {
  const named = new Set(input.document.limits.flatMap(({ place }) => (place.kind === 'bus' ? [place.bus] : [])))
  return result.places.filter(({ busId }) => busId === result.supply?.busId || named.has(busId))
}

const rowsOf = (one: Start, context: ReportContext): readonly Row[] => {
  const { input, words } = context
  const { document } = input
  const say = words.sheets.commissioning
  const { record, result, motor, start } = one
  const changeOver = result.changeOvers.find(({ motorId, to }) => motorId === motor.motorId && to === 'running')
  const places = watched(one, context)
  const blank = ''
  return [
    { title: say.start(motorTag(document, motor.motorId), record.tag) },
    ...places.flatMap((place): readonly Row[] => {
      const tag = busTag(document, place.busId)
      const settled = place.settledAfterStart
      return [
        [say.before(tag), volts(place.before), blank],
        [say.deepest(tag), `${volts(place.deepest.voltage)}, ${withSeconds(place.deepest.at)}`, blank],
        [say.settled(tag), settled === null ? say.notReached : volts(settled), blank],
      ]
    }),
    [say.atMotor, volts(start.standstill.motorVoltage), blank],
    [say.line, `${current(start.standstill.lineCurrent)}\u2009A`, blank],
    ...(changeOver
      ? [[say.changeOver, `${withSeconds(changeOver.at)}, ${rpm(changeOver.speed)}\u2009r/min`, blank]]
      : []),
    [
      say.runUp(document.settings.speedCriterion.text),
      start.timeToCriterion === null ? say.notReached : withSeconds(start.timeToCriterion),
      blank,
    ],
    ...result.motors.flatMap(({ motorId, running }): readonly Row[] =>
      running ? [[say.running(motorTag(document, motorId)), volts(running.lowestVoltage.voltage), blank]] : [],
    ),
  ]
}

/** What to measure at commissioning, with what the model says and room for what is found. */
export const commissioning: Section = (context) => {
  const { paper, input, words, width } = context
  const say = words.sheets.commissioning
  const starts = computedRuns(runsOf(input, ['design'])).flatMap(({ record, result }) =>
    result.motors.flatMap((motor) => (motor.start ? [{ record, result, motor, start: motor.start }] : [])),
  )
  if (starts.length === 0)
    return [chapter(context, 'commissioning', say.title), ...paragraph(paper, say.none, { width })]
  return [
    chapter(context, 'commissioning', say.title),
    ...paragraph(paper, say.intro, { width }),
    dataTable(paper, {
      width,
      columns: [
        { head: say.heads.what, width: 1.6 },
        { head: say.heads.predicted, width: 1.2, align: 'right' },
        { head: say.heads.measured, width: 1 },
      ],
      rows: starts.flatMap((one) => rowsOf(one, context)),
    }),
    ...paragraph(paper, say.after, { width }),
  ]
}
