import type { ReactElement } from 'react'
import { block } from '../paper/block'
import type { Paper } from '../paper/paper'
import { body, colour } from '../theme'
import { typeset } from './typeset'

/** Height of a small letter in parts of the size, which the formula's unit is counted in. */
const exHeight = 0.465
const indent = 18

/** A displayed formula, painted as shapes. */
export const formulaBlock = (paper: Paper, tex: string, width: number): ReactElement => {
  const formula = typeset(tex)
  const ex = body.size * 1.04 * exHeight
  const [vx, vy, vw] = formula.viewBox
  const natural = formula.width * ex
  const shrink = Math.min(1, (width - indent) / natural)
  const scale = (natural / vw) * shrink
  return block(paper, { width, height: formula.height * ex * shrink, above: 3, below: 8 }, (pdf) => {
    pdf.save().translate(indent, 0).scale(scale).translate(-vx, -vy)
    for (const { d, matrix, clip } of formula.shapes) {
      if (d === '') continue
      const [a, b, c, e, f, g] = matrix
      pdf.save()
      if (clip) pdf.rect(...clip).clip()
      pdf.transform(a, b, c, e, f, g).path(d).fill(colour('ink')).restore()
    }
    pdf.restore()
  })
}
