import { rect, type SceneItem, text } from '../scene'
import { textWidth } from '../text-width'
import { wrapText } from '../wrap-text'
import type { ValueLines } from './value-lines'

const tagSize = 2.6
export const valueSize = 2.3
const leading = 2.9
const padding = 0.9
/** Longest line before it is broken. */
const widest = 34

/** A value sheet with its size known: full sheets have a frame and a line for each value, brief ones are one line of text. */
export interface ValueSheet {
  width: number
  height: number
  items: (x: number, y: number) => readonly SceneItem[]
}

const full = ({ tag, lines }: ValueLines): ValueSheet => {
  const tagLines = wrapText(tag, widest, tagSize, 'semibold')
  const valueLines = lines.flatMap((one) => wrapText(one, widest, valueSize))
  const width =
    Math.max(
      ...tagLines.map((one) => textWidth(one, tagSize, 'semibold')),
      ...valueLines.map((one) => textWidth(one, valueSize)),
    ) +
    2 * padding
  const height = (tagLines.length + valueLines.length) * leading + 2 * padding - 0.4
  return {
    width,
    height,
    items: (x, y) => [
      rect({ x, y, width, height }, { fill: 'sheet', stroke: 'rule', strokeWidth: 0.14 }),
      ...tagLines.map((one, i) =>
        text(x + padding, y + padding + 1.9 + i * leading, one, { size: tagSize, weight: 'semibold' }),
      ),
      ...valueLines.map((one, i) =>
        text(x + padding, y + padding + 1.9 + (tagLines.length + i) * leading, one, { size: valueSize, ink: 'soft' }),
      ),
    ],
  }
}

const brief = ({ tag, lines }: ValueLines): ValueSheet => {
  const value = lines.slice(0, 2).join(', ')
  const tagWidth = textWidth(tag, valueSize, 'semibold')
  return {
    width: tagWidth + 1.2 + textWidth(value, valueSize),
    height: 2.6,
    items: (x, y) => [
      text(x, y + 1.9, tag, { size: valueSize, weight: 'semibold' }),
      text(x + tagWidth + 1.2, y + 1.9, value, { size: valueSize, ink: 'soft' }),
    ],
  }
}

export type Detail = 'full' | 'brief'

export const valueSheet = (lines: ValueLines, detail: Detail): ValueSheet =>
  detail === 'full' ? full(lines) : brief(lines)
