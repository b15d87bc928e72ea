import type { ReactElement } from 'react'
import { colour } from '../theme'
import { paintText } from '../type/paint-text'
import { block } from './block'
import type { Paper } from './paper'

/** Ruled lines to sign on by hand, side by side, each with its words beneath. */
export const signatureLines = (paper: Paper, labels: readonly string[], width: number): ReactElement => {
  const gap = 14
  const each = (width - gap * (labels.length - 1)) / labels.length
  return block(paper, { width, height: 52, below: 6 }, (pdf) => {
    for (const [i, label] of labels.entries()) {
      const x = i * (each + gap)
      pdf
        .lineWidth(0.6)
        .moveTo(x, 38)
        .lineTo(x + each, 38)
        .stroke(colour('ink'))
      paintText(pdf, label, x, 48, { size: 7.4, colour: colour('soft') })
    }
  })
}
