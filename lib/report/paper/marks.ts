import type { Ink } from '@/lib/drawing/ink'
import type { VerdictWord } from '@/lib/engine/criteria/rule'
import { colour } from '../theme'
import type { Pdf } from '../type/paint-text'

export const verdictInk = { meets: 'meets', close: 'close', fails: 'fails', 'not-assessed': 'soft' } as const

/** Room that a verdict mark takes before its word, in parts of the size. */
export const markWidth = 1.15

/** The mark of a verdict: filled disc, half disc, hollow triangle with a bar, dash; x is its left end, y the baseline. */
export const paintVerdictMark = (
  pdf: Pdf,
  word: VerdictWord,
  x: number,
  y: number,
  size: number,
  ink: Ink = verdictInk[word],
): void => {
  const paint = colour(ink)
  const r = 0.34 * size
  const [cx, cy] = [x + r + 0.02 * size, y - 0.32 * size]
  switch (word) {
    case 'meets':
      pdf.circle(cx, cy, r).fill(paint)
      return
    case 'close':
      pdf
        .lineWidth(0.09 * size)
        .circle(cx, cy, r - 0.045 * size)
        .stroke(paint)
      pdf.path(`M${cx} ${cy - r}A${r} ${r} 0 0 0 ${cx} ${cy + r}Z`).fill(paint)
      return
    case 'fails': {
      const top = cy - r
      const foot = cy + 0.62 * r
      pdf.lineWidth(0.09 * size).lineJoin('miter')
      pdf.polygon([cx, top], [cx + r, foot], [cx - r, foot]).stroke(paint)
      pdf
        .moveTo(cx - r, cy + r)
        .lineTo(cx + r, cy + r)
        .stroke(paint)
      return
    }
    case 'not-assessed':
      pdf
        .lineWidth(0.1 * size)
        .moveTo(cx - r, cy)
        .lineTo(cx + r, cy)
        .stroke(paint)
  }
}
