import type { StudyDocument } from '../study/document/study-document'
import type { CaseSummary } from '../study/summary'
import { changeReferences, voltageAt, voltageChange } from '../study/voltage-change'
import { changeReferenceNames, instantNames } from '../study/words/quantity-words'
import { busTag, caseTag } from '../study/words/tags'
import type { Cell, Table } from './csv-text'

const instants = ['first', 'deepest', 'settled-after-start', 'settled-after-process'] as const

const percent = (part: number | null): Cell => (part === null ? null : 100 * part)

/** Voltages of every place in every case: one row for each instant, with all three references. */
export const placeTable = (document: StudyDocument, cases: readonly CaseSummary[]): Table => ({
  name: 'voltages',
  heads: [
    'case',
    'place',
    'nominal, kV',
    'before, kV',
    'instant',
    'voltage, kV',
    'at, s',
    ...changeReferences.map((reference) => changeReferenceNames[reference]),
    'highest over the run, kV',
  ],
  rows: cases.flatMap((each) =>
    each.places.flatMap((place) =>
      instants.map((instant): Cell[] => {
        const found = voltageAt(place, instant)
        return [
          caseTag(document, each.caseId),
          busTag(document, place.busId),
          place.nominal / 1000,
          place.before / 1000,
          instantNames[instant],
          found && found.voltage / 1000,
          found?.at ?? null,
          ...changeReferences.map((reference) => percent(voltageChange(place, instant, reference))),
          place.highest.voltage / 1000,
        ]
      }),
    ),
  ),
})
