import type { FlickerResult } from '@/lib/engine/flicker/start-flicker'
import { formatNumber } from '@/lib/quantity/format-number'
import type { StudyDocument } from '@/lib/study/document/study-document'
import type { CaseSummary } from '@/lib/study/summary'
import { busTag } from '@/lib/study/words/tags'
import { type FigureRow, FigureTable } from './figure-table'
import { orDash, percent, seconds } from './print'

const severity = (value: number): string => formatNumber(value, { decimals: 2 })

const rows: readonly FigureRow<FlickerResult>[] = [
  { label: 'Largest change, % of nominal', print: ({ largestChange }) => percent(largestChange, 2) },
  {
    label: 'Settled change, % of nominal',
    print: ({ settledChange }) => orDash(settledChange, (value) => percent(value, 2)),
  },
  { label: 'Time with a change above 3.3 % of nominal', print: ({ timeAbove }) => seconds(timeAbove) },
  { label: 'Starts in ten minutes', print: ({ startsIn }) => String(startsIn.tenMinutes) },
  {
    label: 'Short-term Pst by flickermeter, with its lamp',
    print: ({ shortTerm, lamp }) => `${severity(shortTerm.meter)}, ${lamp}`,
  },
  { label: 'Short-term Pst by shape factor 1', print: ({ shortTerm }) => severity(shortTerm.shapeFactor) },
  { label: 'Starts in two hours', print: ({ startsIn }) => String(startsIn.twoHours) },
  { label: 'Long-term Plt by flickermeter', print: ({ longTerm }) => severity(longTerm.meter) },
  { label: 'Long-term Plt by shape factor 1', print: ({ longTerm }) => severity(longTerm.shapeFactor) },
]

/** Flicker and rapid change at the places that limits ask for. */
export function FlickerTable({ document, result }: { document: StudyDocument; result: CaseSummary }) {
  if (!result.flicker) return null
  return (
    <FigureTable
      caption="Flicker and rapid change"
      items={result.flicker}
      itemId={({ busId }) => busId}
      name={({ busId }) => busTag(document, busId)}
      rows={rows}
    />
  )
}
