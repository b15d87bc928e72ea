import type { TextItem } from './scene'
import { capHeight, descent, textWidth } from './text-width'

/** A rectangle on the sheet, mm. */
export interface Box {
  x: number
  y: number
  width: number
  height: number
}

export const overlap = (a: Box, b: Box): number => {
  const width = Math.min(a.x + a.width, b.x + b.width) - Math.max(a.x, b.x)
  const height = Math.min(a.y + a.height, b.y + b.height) - Math.max(a.y, b.y)
  return width > 0 && height > 0 ? width * height : 0
}

/** The room that a text takes, from the top of its capitals to below its descenders. */
export const textBox = (item: TextItem): Box => {
  const length = textWidth(item.text, item.size, item.weight)
  const before = item.anchor === 'start' ? 0 : item.anchor === 'middle' ? length / 2 : length
  const rise = capHeight * item.size
  const height = rise + descent * item.size
  return { x: item.x - before, y: item.y - rise, width: length, height }
}
