import type { Ink } from '@/lib/drawing/ink'
import type { VerdictWord } from '@/lib/engine/criteria/rule'
import { colour } from '../theme'
import type { Weight } from '../type/faces'
import { type Pdf, paintLine } from '../type/paint-text'
import { type Line, plain, type Run, rich, wrapRuns } from '../type/rich-text'
import { markWidth, paintVerdictMark, verdictInk } from './marks'

export interface Cell {
  text: string
  /** Our own wording, whose markup is read. */
  markup?: boolean
  weight?: Weight
  ink?: Ink
  /** Puts the verdict's mark before the text. */
  verdict?: VerdictWord
  /** Raised behind the text, for example the number of a source. */
  raised?: string
  /** Destination within the report. */
  link?: string
}

export interface PreparedCell extends Cell {
  lines: readonly Line[]
}

const raisedRun = (text: string): Run => ({ text, weight: 'regular', scale: 0.7, rise: 0.36 })

/** A cell broken into lines for its column. */
export const preparedCell = (cell: Cell | string, width: number, size: number): PreparedCell => {
  const content: Cell = typeof cell === 'string' ? { text: cell } : cell
  const mark = content.verdict ? markWidth * size : 0
  const text = content.markup ? rich(content.text, content.weight) : plain(content.text, content.weight)
  const runs = content.raised ? [...text, raisedRun(content.raised)] : text
  return { ...content, lines: wrapRuns(runs, Math.max(width - mark, 4 * size), size) }
}

interface CellPlace {
  /** Left end, middle or right end of the text, as `align` says. */
  x: number
  /** Baseline of the first line. */
  y: number
  size: number
  leading: number
  align: 'left' | 'right' | 'center' | undefined
}

export const paintCell = (pdf: Pdf, cell: PreparedCell, place: CellPlace): void => {
  const { size, leading, align = 'left' } = place
  const mark = cell.verdict ? markWidth * size : 0
  const widest = Math.max(0, ...cell.lines.map((line) => line.width))
  const left = align === 'left' ? place.x : align === 'right' ? place.x - widest - mark : place.x - (widest + mark) / 2
  if (cell.verdict) paintVerdictMark(pdf, cell.verdict, left, place.y, size, cell.ink)
  const ink = cell.ink ?? (cell.verdict ? verdictInk[cell.verdict] : cell.link ? 'accent' : 'ink')
  const x = align === 'left' ? place.x + mark : align === 'right' ? place.x : place.x + mark / 2
  for (const [i, line] of cell.lines.entries())
    paintLine(pdf, line, x, place.y + i * leading, { size, colour: colour(ink) }, align)
  if (cell.link) {
    const height = cell.lines.length * leading
    pdf.goTo(left, place.y - 0.8 * size, widest + mark, height, cell.link)
  }
}
