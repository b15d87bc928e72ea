import type { StudyDocument } from '@/lib/study/document/study-document'
import { type ModelRow, modelComparison } from '@/lib/study/model-comparison'
import type { CaseSummary } from '@/lib/study/summary'
import { modelWords } from '@/lib/study/words/model-words'
import { FigureTable } from './figure-table'
import * as print from './print'

const { current, orDash, percent, seconds, torque, voltage } = print

const printed: Record<ModelRow['quantity'], (value: number) => string> = {
  time: seconds,
  voltage,
  current,
  torque,
  part: (value) => percent(value, 1),
}

interface Column {
  name: string
  print: (row: ModelRow) => string
}

/** Figures of a case by its own model beside those of the quasi-static one; nothing for quasi-static cases. */
export function TransientTable({ document, result }: { document: StudyDocument; result: CaseSummary }) {
  const rows = modelComparison(document, result)
  if (rows.length === 0) return null
  const columns: readonly Column[] = [
    { name: modelWords[result.model], print: ({ own, quantity }) => orDash(own, printed[quantity]) },
    { name: 'quasi-static', print: ({ steady, quantity }) => orDash(steady, printed[quantity]) },
    {
      name: 'difference',
      print: ({ own, steady }) =>
        own === null || steady === null || steady === 0 ? '–' : percent(own / steady - 1, 1),
    },
  ]
  return (
    <FigureTable
      caption={`Models compared: ${modelWords[result.model]} and quasi-static`}
      items={columns}
      itemId={({ name }) => name}
      name={({ name }) => name}
      rows={rows.map((row) => ({ label: row.name, print: (column: Column) => column.print(row) }))}
    />
  )
}
