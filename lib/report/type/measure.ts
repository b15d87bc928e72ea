import type { Font } from 'fontkit'
import { faces, fontFor, type Weight } from './faces'
import { printable } from './printable'

const known: Record<Weight, Map<string, number>> = { regular: new Map(), semibold: new Map() }

/** Width of a word with the space behind it, in parts of the size, kerned as it will be painted. */
const wordWidth = (word: string, weight: Weight): number => {
  const found = known[weight].get(word)
  if (found !== undefined) return found
  const face = faces()[weight]
  const parts: { text: string; font: Font }[] = []
  for (const character of word) {
    const font = fontFor(face, character.codePointAt(0) ?? 0) ?? face.own
    const last = parts.at(-1)
    if (last?.font === font) last.text += character
    else parts.push({ text: character, font })
  }
  const width = parts.reduce((sum, { text, font }) => sum + font.layout(text).advanceWidth / font.unitsPerEm, 0)
  known[weight].set(word, width)
  return width
}

/** Width in points of a text set in the report's family, kerned as it will be painted. */
export const measure = (text: string, size: number, weight: Weight = 'regular'): number => {
  let sum = 0
  // The file's own text layout goes word by word, each with its space, so that kerning never crosses a space.
  for (const word of printable(text).match(/[^ ]* |[^ ]+$/g) ?? []) sum += wordWidth(word, weight)
  return sum * size
}
