import type { ReactElement } from 'react'
import { overallVerdict } from '@/lib/engine/criteria/overall'
import type { RuleInput } from '@/lib/engine/criteria/rule'
import type { StarterRecord } from '@/lib/study/document/starter-record'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { listedTags } from '@/lib/study/words/list-words'
import { starterPhrase } from '@/lib/study/words/starter-phrase'
import { loadConditionTag, motorTag, plantConditionTag, supplyTag } from '@/lib/study/words/tags'
import { dataTable, type Row } from '../paper/data-table'
import { paragraph } from '../paper/text-block'
import { chapter, type ReportContext } from '../report-context'
import { current, percent, rpm, seconds } from '../values/figures'
import { type CaseRun, roles, runsOf } from '../values/roles'
import { closeMargins, figureOf, verdictRows } from '../values/verdict-rows'
import { changeAtSupply, supplyPlace } from './results/start-tables'
import type { Section } from './section'

const startsOf = ({ record }: CaseRun, { input }: ReportContext) =>
  input.document.schedules.find(({ id }) => id === record.schedule)?.starts ?? []

/** What two cases must share to differ in the method alone. */
const setting = (run: CaseRun, context: ReportContext): string => {
  const { supply, plantCondition, loadCondition } = run.record
  return JSON.stringify([
    supply,
    plantCondition,
    loadCondition,
    startsOf(run, context).map(({ motor, at }) => [motor, at.si]),
  ])
}

/** Cases without departures from the records that differ in the starting method alone, two or more together. */
const compared = (context: ReportContext): readonly (readonly CaseRun[])[] => {
  const groups = new Map<string, CaseRun[]>()
  for (const run of runsOf(context.input, roles)) {
    if (run.record.changes.length > 0 || run.result === null) continue
    const key = setting(run, context)
    groups.set(key, [...(groups.get(key) ?? []), run])
  }
  return [...groups.values()].filter((runs) => {
    const methods = runs.map((run) => JSON.stringify(startsOf(run, context).map(({ starter }) => starter)))
    return new Set(methods).size > 1
  })
}

const methodWords = (run: CaseRun, context: ReportContext): string => {
  const used = new Set(startsOf(run, context).map(({ starter }) => starter))
  const records = context.input.document.plant.starters.filter(({ id }) => used.has(id))
  return records.map((record: StarterRecord) => starterPhrase(record)).join('; ')
}

/** The worst of several starts in a case. */
const worst = (values: readonly (number | null)[], pick: (...of: number[]) => number): number | null =>
  values.some((value) => value === null) || values.length === 0
    ? null
    : pick(...values.filter((value) => value !== null))

const rowOf = (run: CaseRun, rules: readonly RuleInput[], context: ReportContext): Row => {
  const { input, words } = context
  const say = words.sheets.comparison
  const { document } = input
  const own = input.result.verdicts.filter(({ caseId }) => caseId === run.record.id)
  const { word, governing } = overallVerdict(own, rules, closeMargins(document))
  // A case with a limit that is not assessed says so, whatever the others are.
  const open = word === 'not-assessed' ? own.find((one) => one.inUse && one.word === word) : undefined
  const [decides] = verdictRows(
    document,
    [open ?? governing ?? own[0]].filter((one) => one !== undefined),
  )
  const starts = (run.result?.motors ?? []).flatMap(({ start }) => (start ? [start] : []))
  const times = starts.map(({ outcome }) => (outcome.kind === 'started' ? outcome.at : null))
  const runUp = worst(times, Math.max)
  const least = starts.toSorted((a, b) => a.leastAccelerating.ofRated - b.leastAccelerating.ofRated)[0]
  return [
    { text: run.record.tag, weight: 'semibold' },
    methodWords(run, context),
    run.result ? percent(changeAtSupply(run.result)) : '–',
    starts.length === 0 ? '–' : current(Math.max(...starts.map(({ standstill }) => standstill.lineCurrent))),
    runUp === null ? say.notReached : seconds(runUp),
    least ? `${percent(least.leastAccelerating.ofRated, 1)} (${rpm(least.leastAccelerating.speed)}\u2009r/min)` : '–',
    percent(
      worst(
        starts.map(({ heatUsed }) => heatUsed.figure),
        Math.max,
      ),
      1,
    ),
    decides
      ? {
          text: `${decides.limit.tag}: ${figureOf(decides, document)}`,
          verdict: decides.verdict.word,
          ink: 'ink',
        }
      : '–',
  ]
}

/** Starting methods beside one another where all else is the same. */
export const methodComparison: Section = (context) => {
  const { paper, input, words, width } = context
  const { document } = input
  const say = words.sheets.comparison
  const groups = compared(context)
  const { rules } = studyRunInput(document)
  const right = 'right' as const
  const table = (): ReactElement =>
    dataTable(paper, {
      width,
      size: 7.2,
      columns: [
        { head: say.heads.case, width: 27, fixed: true },
        { head: say.heads.method, width: 2 },
        { head: say.heads.change(supplyPlace(context)), width: 0.9, align: right },
        { head: say.heads.line, width: 0.8, align: right },
        { head: say.heads.runUp, width: 0.8, align: right },
        { head: say.heads.torque, width: 1.1, align: right },
        { head: say.heads.heat, width: 0.6, align: right },
        { head: say.heads.verdict, width: 1.7 },
      ],
      rows: groups.flatMap((runs): readonly Row[] => {
        const { record } = runs[0]!
        const motors = listedTags(startsOf(runs[0]!, context).map(({ motor }) => motorTag(document, motor)))
        const title = say.group(
          motors,
          supplyTag(document, record.supply),
          plantConditionTag(document, record.plantCondition),
          loadConditionTag(document, record.loadCondition),
        )
        return [{ title }, ...runs.map((run) => rowOf(run, rules, context))]
      }),
    })
  return [
    chapter(context, 'comparison', say.title),
    ...paragraph(paper, groups.length === 0 ? say.none : say.intro, { width }),
    ...(groups.length === 0 ? [] : [table()]),
  ]
}
