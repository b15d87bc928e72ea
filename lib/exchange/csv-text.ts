import Papa from 'papaparse'

/** A cell: a text, a number, or nothing where there is no figure. */
export type Cell = string | number | null

/** A table as it is exchanged: heads with their unit, then rows of equal length. */
export interface Table {
  /** File name without its ending. */
  name: string
  heads: readonly string[]
  rows: readonly (readonly Cell[])[]
}

/** What a spreadsheet may take for a formula, also behind blanks and in full width. */
const formulaStart = /^\s*[=+\-@＝＋－＠]|^[\t\r\n]/u

/** Nine digits: more than any figure is good for, and the same on every machine. */
const nineDigits = (value: number): Cell => (Number.isFinite(value) ? Number(value.toPrecision(9)) || 0 : null)

/**
 * A table as comma-separated values (RFC 4180, lines ended by CR LF, decimal point). A text that a spreadsheet would run
 * as a formula gets an apostrophe before it; numbers stay numbers.
 *
 * @param byteOrderMark for spreadsheets that would not take the text as UTF-8 otherwise
 */
export const csvText = ({ heads, rows }: Table, byteOrderMark = false): string => {
  const cells = [heads, ...rows].map((row) => row.map((cell) => (typeof cell === 'number' ? nineDigits(cell) : cell)))
  const text = Papa.unparse(cells, { newline: '\r\n', escapeFormulae: formulaStart })
  return `${byteOrderMark ? '\uFEFF' : ''}${text}\r\n`
}
