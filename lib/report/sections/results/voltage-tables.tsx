import type { ReactElement } from 'react'
import type { CaseResult, PlaceResult } from '@/lib/engine/case-result'
import { formatNumber } from '@/lib/quantity/format-number'
import type { CaseRecord } from '@/lib/study/document/case-records'
import { relativeVoltage } from '@/lib/study/voltage-change'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { caseOutcomeSentence } from '@/lib/study/words/outcome-words'
import { busTag } from '@/lib/study/words/tags'
import type { Volt } from '@/lib/units/si'
import { stack } from '../../paper/block'
import { dataTable } from '../../paper/data-table'
import { caption, paragraph } from '../../paper/text-block'
import type { ReportContext } from '../../report-context'
import { dense } from '../../theme'
import { percent, volts, withSeconds } from '../../values/figures'

const remaining = (place: PlaceResult, voltage: Volt): string =>
  `${volts(voltage)} ${percent(relativeVoltage(place, voltage, 'remaining-of-nominal'))}\u2009%`

/** Two lines: voltage and per cent of nominal, then both changes. */
const cell = (place: PlaceResult, voltage: Volt | null, notReached: string, at = ''): string => {
  if (voltage === null) return notReached
  const before = percent(relativeVoltage(place, voltage, 'change-of-before'))
  const nominal = percent(relativeVoltage(place, voltage, 'change-of-nominal'))
  return `${remaining(place, voltage)}\n${before} | ${nominal}${at}`
}

const table = ({ paper, input, words, width }: ReportContext, places: readonly PlaceResult[]): ReactElement => {
  const { heads, notReached, at } = words.results.voltages
  return dataTable(paper, {
    width,
    columns: [
      { head: heads.place, width: 58, fixed: true },
      { head: heads.before, width: 0.85, align: 'right' },
      { head: heads.first, width: 0.9, align: 'right' },
      { head: heads.deepest, width: 1.15, align: 'right' },
      { head: heads.settledAfterStart, width: 0.9, align: 'right' },
      { head: heads.settledAfterProcess, width: 0.9, align: 'right' },
    ],
    rows: places.map((place) => [
      {
        text: `${busTag(input.document, place.busId)} ${formatNumber(place.nominal / 1000)}\u2009kV`,
        weight: 'semibold' as const,
      },
      remaining(place, place.before),
      cell(place, place.first, notReached),
      cell(place, place.deepest.voltage, notReached, ` ${at(withSeconds(place.deepest.at))}`),
      cell(place, place.settledAfterStart, notReached),
      cell(place, place.settledAfterProcess, notReached),
    ]),
  })
}

/** Tables of up to this many places stay on one page. */
const mostTogether = 14

/** The voltages of one case at every place, under its sentence. */
export const voltageTable = (
  context: ReportContext,
  { record, result }: { record: CaseRecord; result: CaseResult },
): ReactElement => {
  const { paper, input, width } = context
  const { document } = input
  const name = (id: string) => busTag(document, id)
  const head = caption(paper, `${record.tag}: ${caseSentence(record, document)}.`, { width, keep: 70 })
  if (result.places.length === 0)
    return stack([...head, ...paragraph(paper, caseOutcomeSentence(result.outcome, name), { width, ...dense })])
  return stack([...head, table(context, result.places)], { together: result.places.length <= mostTogether })
}
