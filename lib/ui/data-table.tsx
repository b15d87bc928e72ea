import type { ReactNode } from 'react'
import { ScrollRegion } from './scroll-region'

export interface Column<Row> {
  id: string
  label: string
  /** Numbers stand flush right under each other. */
  numeric?: boolean
  cell: (row: Row) => ReactNode
}

interface DataTableProps<Row> {
  caption: string
  columns: readonly Column<Row>[]
  rows: readonly Row[]
  rowId: (row: Row) => string
  /** The first column names the row. */
  chosen?: string | undefined
  captionHidden?: boolean
}

/** A dense table; wider than its place it scrolls by itself, never the page. */
export function DataTable<Row>({ caption, columns, rows, rowId, chosen, captionHidden = true }: DataTableProps<Row>) {
  return (
    <ScrollRegion label={`${caption}, table`} className="w-fit max-w-full border border-hair bg-sheet">
      <table className="dense">
        <caption className={captionHidden ? 'sr-only' : 'px-2.5 pt-1.5 pb-0.5 text-left font-semibold'}>
          {caption}
        </caption>
        <thead>
          <tr>
            {columns.map((column) => (
              <th key={column.id} scope="col" className={column.numeric ? 'number' : undefined}>
                {column.label}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map((row) => (
            <tr key={rowId(row)} className={rowId(row) === chosen ? 'bg-tint' : 'hover:bg-tint'}>
              {columns.map((column, index) =>
                index === 0 ? (
                  <th key={column.id} scope="row">
                    {column.cell(row)}
                  </th>
                ) : (
                  <td key={column.id} className={column.numeric ? 'number' : undefined}>
                    {column.cell(row)}
                  </td>
                ),
              )}
            </tr>
          ))}
        </tbody>
      </table>
    </ScrollRegion>
  )
}
