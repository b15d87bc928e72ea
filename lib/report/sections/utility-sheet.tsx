import type { SupplyRecord } from '@/lib/study/document/network-records'
import { dataTable } from '../paper/data-table'
import { signatureLines } from '../paper/signature-lines'
import type { Cell } from '../paper/table-cell'
import { list, paragraph } from '../paper/text-block'
import { appendix, type ReportContext } from '../report-context'
import { supplyFields } from '../values/network-fields'
import type { RecordField } from '../values/record-field'
import type { Section } from './section'

const columnsAtOnce = 3

/** A value as the study has it, or what is asked for in its place. */
const cellOf = (field: RecordField<SupplyRecord>, supply: SupplyRecord, { words }: ReportContext): Cell => {
  const say = words.sheets.utility
  const text = field.of(supply)?.text ?? ''
  // Either the voltage held at the bus or the open-circuit voltage is stated, never both.
  const other = supply.before.kind === 'bus-voltage' ? words.fields.openCircuit : words.fields.before
  if (text === '' && field.label === other) return { text: '–', ink: 'soft' }
  if (text === '') return { text: say.blank, ink: 'fails', weight: 'semibold' }
  if (text === words.fields.values.unknown) return { text: say.unknown, ink: 'fails', weight: 'semibold' }
  return { text }
}

/** What the utility is asked to confirm, blanks flagged, with a line to sign on. */
export const utilitySheet: Section = (context) => {
  const { paper, input, words, width } = context
  const { document } = input
  const say = words.sheets.utility
  const { supplies } = document.plant
  const fields = supplyFields(words.fields, document)
  const tables = Array.from({ length: Math.ceil(supplies.length / columnsAtOnce) }, (_, i) => {
    const shown = supplies.slice(i * columnsAtOnce, (i + 1) * columnsAtOnce)
    return dataTable(paper, {
      width,
      columns: [
        { head: words.records.input.field, width: 150, fixed: true },
        ...shown.map(({ tag }) => ({ head: tag, width: 1 })),
      ],
      rows: fields.map((field) => [
        { text: field.label, markup: true, ink: 'soft' as const },
        ...shown.map((supply) => cellOf(field, supply, context)),
      ]),
    })
  })
  const utility = document.head.utility.trim() === '' ? say.noUtility : document.head.utility
  return [
    appendix(context, 'utility-sheet', say.title),
    ...paragraph(paper, say.intro(utility), { width }),
    ...tables,
    ...paragraph(paper, `**${say.ask}**`, { width, below: 2, keep: 40 }),
    ...list(paper, say.asked, { width }),
    ...paragraph(paper, `**${say.confirmed}**`, { width, above: 8, below: 0, keep: 60 }),
    signatureLines(paper, say.lines, width),
  ]
}
