import type { ReactElement } from 'react'
import { band, colour, dense, zebra } from '../theme'
import { type Pdf, paintLine } from '../type/paint-text'
import { plain, rich, wrapRuns } from '../type/rich-text'
import { block, stack } from './block'
import type { Paper } from './paper'
import { type Cell, type PreparedCell, paintCell, preparedCell } from './table-cell'

export interface Column {
  /** Wording of the head, with its markup. */
  head: string
  /** Share of the width that is left after the fixed columns, or points when `fixed`. */
  width: number
  fixed?: boolean
  align?: 'left' | 'right' | 'center'
}

/** Cells of one row, or a title across the table for the rows beneath it. */
export type Row = readonly (Cell | string)[] | { title: string }

export interface TableOptions {
  width: number
  columns: readonly Column[]
  rows: readonly Row[]
  size?: number
  leading?: number
  below?: number
  id?: string
}

const pad = 3.2
const padTop = 2.1

const placed = (columns: readonly Column[], total: number) => {
  const fixed = columns.reduce((sum, one) => sum + (one.fixed ? one.width : 0), 0)
  const shares = columns.reduce((sum, one) => sum + (one.fixed ? 0 : one.width), 0)
  let x = 0
  return columns.map((column) => {
    const width = column.fixed ? column.width : ((total - fixed) * column.width) / shares
    const left = x
    x += width
    return { ...column, left, width }
  })
}

type PlacedColumn = ReturnType<typeof placed>[number]

interface PreparedRow {
  height: number
  title: boolean
  cells: readonly PreparedCell[]
  /** Whether it lies on the second of the two alternating grounds. */
  shaded: boolean
  /** Whether the next row goes on with the cells of this one. */
  goesOn: boolean
}

/** Most lines of a cell in one piece: half a page, so that a table with long cells still breaks well. */
const linesAtOnce = 32

/** A row as one row, or as several where its cells are taller than a page should hold in one piece. */
const inPieces = (cells: readonly PreparedCell[], shaded: boolean, leading: number): readonly PreparedRow[] => {
  const most = Math.max(...cells.map(({ lines }) => lines.length))
  const pieces = Math.max(1, Math.ceil(most / linesAtOnce))
  return Array.from({ length: pieces }, (_, k) => {
    const part = cells.map((cell) => ({ ...cell, lines: cell.lines.slice(k * linesAtOnce, (k + 1) * linesAtOnce) }))
    const height = Math.max(...part.map(({ lines }) => lines.length)) * leading + 2 * padTop
    return { title: false, cells: part, height, shaded, goesOn: k < pieces - 1 }
  })
}

const rule = (pdf: Pdf, y: number, width: number, thickness: number, stroke: string): void => {
  pdf.lineWidth(thickness).strokeColor(stroke).moveTo(0, y).lineTo(width, y).stroke()
}

/** Rows that must share a page: the first two, the last two, and a title with the row beneath it. */
const groupsOf = (rows: readonly PreparedRow[]): readonly (readonly number[])[] => {
  const groups: number[][] = []
  for (const [i] of rows.entries()) {
    const join = i === 1 || (i === rows.length - 1 && i > 0) || (i > 0 && rows[i - 1]!.title)
    if (join) groups.at(-1)!.push(i)
    else groups.push([i])
  }
  return groups
}

/** A table whose head repeats on each page and whose rows are painted whole, a few nodes for hundreds of cells. */
export const dataTable = (paper: Paper, options: TableOptions): ReactElement => {
  const { width, size = dense.size, leading = dense.leading } = options
  const columns = placed(options.columns, width)
  const baseline = leading / 2 + 0.33 * size
  const prepare = (row: Row, index: number): readonly PreparedRow[] => {
    if ('title' in row) {
      const cells = [preparedCell({ text: row.title, weight: 'semibold' }, width - 2 * pad, size)]
      const height = cells[0]!.lines.length * leading + 2 * padTop + 2
      return [{ title: true, cells, height, shaded: false, goesOn: false }]
    }
    const cells = columns.map((column, i) => preparedCell(row[i] ?? '', column.width - 2 * pad, size))
    return inPieces(cells, index % 2 === 1, leading)
  }
  const rows = options.rows.flatMap(prepare)
  const heads = columns.map((column) => wrapRuns(rich(column.head, 'semibold'), column.width - 2 * pad, size))
  const headHeight = Math.max(...heads.map((lines) => lines.length)) * leading + 2 * padTop + 1
  const anchor = (column: PlacedColumn) =>
    column.align === 'right'
      ? column.left + column.width - pad
      : column.align === 'center'
        ? column.left + column.width / 2
        : column.left + pad
  const head = block(paper, { width, height: headHeight, keep: 40, repeats: true }, (pdf) => {
    pdf.rect(0, 0, width, headHeight).fill(band)
    rule(pdf, 0.4, width, 0.8, colour('ink'))
    rule(pdf, headHeight - 0.4, width, 0.8, colour('ink'))
    for (const [i, column] of columns.entries()) {
      for (const [k, line] of heads[i]!.entries())
        paintLine(
          pdf,
          line,
          anchor(column),
          padTop + k * leading + baseline,
          { size, colour: colour('ink') },
          column.align,
        )
    }
  })
  const paintRow = (pdf: Pdf, index: number, top: number): void => {
    const row = rows[index]!
    if (row.title) pdf.rect(0, top, width, row.height).fill(band)
    else if (row.shaded) pdf.rect(0, top, width, row.height).fill(zebra)
    for (const [i, cell] of row.cells.entries()) {
      const column = row.title ? { ...columns[0]!, align: 'left' as const } : columns[i]!
      paintCell(pdf, cell, { x: anchor(column), y: top + padTop + baseline, size, leading, align: column.align })
    }
    const last = index === rows.length - 1
    if (!row.goesOn) rule(pdf, top + row.height - 0.2, width, last ? 0.8 : 0.35, colour(last ? 'ink' : 'grid'))
  }
  const body = groupsOf(rows).map((group) => {
    const height = group.reduce((sum, index) => sum + rows[index]!.height, 0)
    return block(paper, { width, height }, (pdf) => {
      let top = 0
      for (const index of group) {
        paintRow(pdf, index, top)
        top += rows[index]!.height
      }
    })
  })
  const foot = block(paper, { width, height: options.below ?? 8 }, () => undefined)
  return stack([stack([head, ...body], { id: options.id }), foot])
}

/** Words for a table that has nothing in it. */
export const emptyTable = (paper: Paper, words: string, width: number): ReactElement =>
  block(paper, { width, height: dense.leading + 8, below: 6 }, (pdf) => {
    paintLine(pdf, wrapRuns(plain(words), width, dense.size)[0]!, pad, dense.leading, {
      size: dense.size,
      colour: colour('soft'),
    })
  })
