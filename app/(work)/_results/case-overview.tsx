import type { VerdictWord } from '@/lib/engine/criteria/rule'
import type { CaseRecord } from '@/lib/study/document/case-records'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { startOutcomeWords } from '@/lib/study/words/outcome-words'
import { motorTag, plantConditionTag, supplyTag } from '@/lib/study/words/tags'
import { type Column, DataTable } from '@/lib/ui/data-table'
import { Verdict } from '@/lib/ui/verdict'
import { CaseLink } from './case-link'
import { current, orDash, percent, seconds, speed } from './print'
import { caseResult, type Results } from './results'

const worst: readonly VerdictWord[] = ['fails', 'not-assessed', 'close', 'meets']

/** The worst verdict of a case among the limits in use. */
const caseVerdict = ({ summary }: Results, caseId: string): VerdictWord | null => {
  const words = summary.verdicts.filter((row) => row.caseId === caseId && row.inUse).map(({ word }) => word)
  return worst.find((word) => words.includes(word)) ?? null
}

/** The figures of all cases under each other. */
export function CaseOverview({ results, chosen }: { results: Results; chosen: string }) {
  const { document, summary } = results
  const supplyBus = summary.cases.find(({ supply }) => supply)?.supply?.busId
  const bus = document.plant.buses.find(({ id }) => id === supplyBus)?.tag ?? 'supply'
  const place = (record: CaseRecord) => caseResult(results, record.id)?.places.find(({ busId }) => busId === supplyBus)
  const starts = (record: CaseRecord) =>
    caseResult(results, record.id)?.motors.flatMap(({ motorId, start }) => (start ? [{ motorId, start }] : [])) ?? []
  const first = (record: CaseRecord) => starts(record)[0]?.start
  const columns: Column<CaseRecord>[] = [
    {
      id: 'tag',
      label: 'Case',
      cell: (record) => (
        <CaseLink caseId={record.id} title={`${caseSentence(record, document)}.`}>
          {record.tag}
        </CaseLink>
      ),
    },
    { id: 'supply', label: 'Supply', cell: ({ supply }) => supplyTag(document, supply) },
    {
      id: 'start',
      label: 'Start',
      cell: ({ schedule }) => (
        <span className="whitespace-nowrap">
          {document.schedules.find(({ id }) => id === schedule)?.tag ?? schedule}
        </span>
      ),
    },
    {
      id: 'condition',
      label: 'Plant condition',
      cell: ({ plantCondition }) => (
        <span className="whitespace-nowrap">{plantConditionTag(document, plantCondition)}</span>
      ),
    },
    {
      id: 'first',
      label: `${bus}, change at first instant, % of before`,
      numeric: true,
      cell: (record) => {
        const at = place(record)
        return at ? percent((at.before - at.first) / at.before) : '–'
      },
    },
    {
      id: 'deepest',
      label: `${bus}, deepest change, % of before`,
      numeric: true,
      cell: (record) => {
        const at = place(record)
        return at ? percent((at.before - at.deepest.voltage) / at.before) : '–'
      },
    },
    { id: 'at', label: 'at', numeric: true, cell: (record) => orDash(place(record)?.deepest.at, seconds) },
    {
      id: 'line',
      label: 'Line current at standstill',
      numeric: true,
      cell: (record) => orDash(first(record)?.standstill.lineCurrent, current),
    },
    {
      id: 'motor',
      label: 'Motor current at standstill',
      numeric: true,
      cell: (record) => orDash(first(record)?.standstill.motorCurrent, current),
    },
    {
      id: 'time',
      label: `Time to ${document.settings.speedCriterion.text} of rated speed`,
      numeric: true,
      cell: (record) => orDash(first(record)?.timeToCriterion, seconds),
    },
    {
      id: 'torque',
      label: 'Least accelerating torque, % of rated',
      numeric: true,
      cell: (record) => {
        const least = first(record)?.leastAccelerating
        return least ? `${percent(least.ofRated, 1)} at ${speed(least.speed)}` : '–'
      },
    },
    {
      id: 'heat',
      label: 'Heat used',
      numeric: true,
      cell: (record) => orDash(first(record)?.heatUsed.figure, (value) => percent(value, 1)),
    },
    {
      id: 'outcome',
      label: 'Outcome',
      cell: (record) => (
        <span className="whitespace-nowrap">
          {starts(record)
            .map(({ motorId, start }) => `${motorTag(document, motorId)} ${startOutcomeWords[start.outcome.kind]}`)
            .join(', ') || (caseResult(results, record.id) ? 'no start' : 'not computed')}
        </span>
      ),
    },
    {
      id: 'verdict',
      label: 'Limits in use',
      cell: ({ id }) => {
        const word = caseVerdict(results, id)
        return word ? <Verdict word={word} /> : '–'
      },
    },
  ]
  return (
    <section aria-labelledby="all-cases">
      <h2 id="all-cases" className="m-0 mb-1 text-title font-semibold">
        All cases in figures
      </h2>
      <DataTable
        caption="All cases in figures"
        columns={columns}
        rows={document.cases}
        rowId={({ id }) => id}
        chosen={chosen}
      />
      <p className="m-0 mt-1 text-label text-soft">
        Motor figures are those of the motor that is switched on first. Changes are falls in parts of the voltage before
        the start, over the whole run.
      </p>
    </section>
  )
}
