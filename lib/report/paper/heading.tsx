import type { ReactElement } from 'react'
import { colour } from '../theme'
import { paintLine } from '../type/paint-text'
import { plain, wrapRuns } from '../type/rich-text'
import { block } from './block'
import type { Heading, Paper } from './paper'

const sizes = {
  1: { size: 15, leading: 19, above: 12, below: 7 },
  2: { size: 11, leading: 14.5, above: 9, below: 4 },
} as const

/** Paints a heading and enters it in contents and outline; it stays with what follows. */
export const heading = (paper: Paper, width: number, entry: Heading): ReactElement => {
  paper.headings.push(entry)
  const { size, leading, above, below } = sizes[entry.level]
  const indent = entry.number === '' ? 0 : entry.level === 1 ? 26 : 30
  const lines = wrapRuns(plain(entry.title, 'semibold'), width - indent, size)
  const style = { size, colour: colour(entry.level === 1 ? 'accent' : 'ink') }
  const height = lines.length * leading + (entry.level === 1 ? 5 : 0)
  return block(paper, { id: entry.id, width, height, above, below, keep: 90 }, (pdf) => {
    paper.mark(entry)
    const baseline = (i: number) => i * leading + leading / 2 + 0.33 * size
    if (entry.number !== '')
      paintLine(pdf, wrapRuns(plain(entry.number, 'semibold'), indent, size)[0]!, 0, baseline(0), style)
    for (const [i, line] of lines.entries()) paintLine(pdf, line, indent, baseline(i), style)
    if (entry.level === 1) {
      pdf
        .lineWidth(0.8)
        .strokeColor(colour('accent'))
        .moveTo(0, height - 1)
        .lineTo(width, height - 1)
        .stroke()
    }
  })
}
