import { line } from '../scene'

const spacing = 1.5
const length = 1.2

/** Short strokes at 45° along a level from x = `from` to `to`, on its upper or lower side: path data. */
export const hatch = (from: number, to: number, y: number, side: 'above' | 'below'): string => {
  const down = side === 'below' ? length : -length
  const strokes: string[] = []
  // Strokes stand on a grid of their own, so that two levels side by side are hatched in step.
  for (let x = Math.ceil((from + length) / spacing) * spacing; x <= to; x += spacing) {
    strokes.push(
      line([
        [x, y],
        [x - length, y + down],
      ]),
    )
  }
  return strokes.join('')
}

/** How far the strokes stand out. */
export const hatchDepth = length
