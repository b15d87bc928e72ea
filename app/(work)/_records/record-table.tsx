'use client'

import { useMemo } from 'react'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import { DataTable } from '@/lib/ui/data-table'
import { type Draft, type DraftPath, type GroupDraft, withDraftAt } from '@/lib/ui/form/draft'
import type { Field, Options } from '@/lib/ui/form/field'
import { fieldAt, onlyValue } from '@/lib/ui/form/show-draft'
import { recordDraft } from '@/lib/ui/form/to-draft'
import type { KindDescription } from './kind-description'
import { moveInTable } from './move-in-table'
import { RecordCell } from './record-cell'
import type { RecordRow } from './record-row'

interface RecordTableProps {
  description: KindDescription
  rows: readonly RecordRow[]
  tags: Options
  style: NumberStyle
  editable: boolean
  chosen: string | undefined
  /** A sentence for each record, by identity. */
  inWords?: Readonly<Record<string, string>> | undefined
  onOpen: (id: string) => void
  onCell: (row: RecordRow, draft: GroupDraft) => Promise<string | null>
}

interface Line {
  row: RecordRow
  draft: GroupDraft
  tag: string
}

const isNumeric = (field: Field | undefined): boolean =>
  field?.kind === 'quantity' || field?.kind === 'whole' || field?.kind === 'decimal'

/** All records of a kind, one a row; the tag opens the record's sheet beside the table. */
export function RecordTable({
  description,
  rows,
  tags,
  style,
  editable,
  chosen,
  inWords,
  onOpen,
  onCell,
}: RecordTableProps) {
  const { fields, columns, many } = description
  const lines = useMemo<Line[]>(
    () =>
      rows.map((row) => {
        const draft = recordDraft(fields, row.values, style)
        const tag = draft.parts.tag
        return { row, draft, tag: tag?.is === 'text' ? tag.text : row.id }
      }),
    [rows, fields, style],
  )
  const cell = ({ row, draft, tag }: Line, column: DraftPath) => {
    const path = onlyValue(fields, draft, column)
    const found = fieldAt(fields, draft, path)
    if (!found) return <span className="text-soft">–</span>
    return (
      <RecordCell
        field={found.field}
        draft={found.draft}
        tag={tag}
        tags={tags}
        style={style}
        editable={editable}
        onCommit={(next: Draft) => onCell(row, withDraftAt(draft, path, next))}
      />
    )
  }
  return (
    <DataTable
      caption={many}
      rows={lines}
      rowId={(line) => line.row.id}
      chosen={chosen}
      columns={[
        {
          id: 'tag',
          label: 'Tag',
          cell: ({ row, tag }) => (
            <button
              type="button"
              data-cell
              className="link border-0 bg-transparent p-0 font-semibold whitespace-nowrap"
              aria-expanded={row.id === chosen}
              onKeyDown={moveInTable}
              onClick={() => onOpen(row.id)}
            >
              {tag}
            </button>
          ),
        },
        ...columns.map(({ label, path }) => ({
          id: path.join('.'),
          label,
          numeric: lines.some((line) =>
            isNumeric(fieldAt(fields, line.draft, onlyValue(fields, line.draft, path))?.field),
          ),
          cell: (line: Line) => cell(line, path),
        })),
        ...(inWords
          ? [
              {
                id: 'in-words',
                label: 'In words',
                cell: ({ row }: Line) => <span className="block min-w-80">{inWords[row.id] ?? ''}</span>,
              },
            ]
          : []),
      ]}
    />
  )
}
