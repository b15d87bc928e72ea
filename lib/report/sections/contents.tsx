import type { ReactElement } from 'react'
import { block, row, stack } from '../paper/block'
import type { Heading, Paper } from '../paper/paper'
import { paragraph } from '../paper/text-block'
import type { ReportContext } from '../report-context'
import { colour, small } from '../theme'
import { measure } from '../type/measure'
import { paintLine, paintText } from '../type/paint-text'
import { plain, wrapRuns } from '../type/rich-text'

const lookOf = {
  1: { size: 9.8, leading: 14, weight: 'semibold', indent: 0, number: 26, above: 3.5 },
  2: { size: 8.8, leading: 11.6, weight: 'regular', indent: 26, number: 28, above: 0 },
} as const

const entry = (paper: Paper, { id, level, number, title }: Heading, width: number): ReactElement => {
  const { size, leading, weight, indent, number: numberWidth, above } = lookOf[level]
  const left = indent + numberWidth
  const lines = wrapRuns(plain(title, weight), width - left - 40, size)
  const height = lines.length * leading
  const baseline = leading / 2 + 0.33 * size
  const style = { size, colour: colour('ink') }
  // The page is known once the report is laid out, which is before it is painted.
  return block(paper, { width, height, above }, (pdf) => {
    const page = String(paper.pageOf(id) ?? '')
    const last = baseline + (lines.length - 1) * leading
    const right = width - measure(page, size)
    paintText(pdf, number, indent, baseline, { ...style, weight })
    for (const [i, line] of lines.entries()) paintLine(pdf, line, left, baseline + i * leading, style)
    paintText(pdf, page, right, last, { ...style, weight })
    const from = left + (lines.at(-1)?.width ?? 0) + 5
    pdf
      .lineWidth(0.5)
      .dash([0.6, 2.2])
      .moveTo(from, last)
      .lineTo(right - 5, last)
      .stroke(colour('rule'))
      .undash()
    pdf.goTo(0, 0, width, height, id)
  })
}

/** Headings in two columns of about equal height; a chapter's sub-headings stay behind it. */
const columnsOf = (headings: readonly Heading[]): readonly (readonly Heading[])[] => {
  const height = ({ level }: Heading) => lookOf[level].leading + lookOf[level].above
  const half = headings.reduce((sum, one) => sum + height(one), 0) / 2
  let used = 0
  const at = headings.findIndex((one) => {
    used += height(one)
    return used > half && one.level === 1
  })
  return at <= 0 ? [headings] : [headings.slice(0, at), headings.slice(at)]
}

/** The contents: every heading with its page, as links. Written after all sections, because these number the headings. */
export const contents = (
  { paper, words, width }: ReportContext,
  headings: readonly Heading[],
): readonly ReactElement[] => {
  const gap = 22
  const columnWidth = (width - gap) / 2
  const columns = columnsOf(headings).map((column) => stack(column.map((one) => entry(paper, one, columnWidth))))
  return [...paragraph(paper, words.frame.contentsNote, { width, ...small, ink: 'soft', below: 8 }), row(columns, gap)]
}
