import { faces, fontFor, type Weight } from './faces'

const known: Record<Weight, Map<string, number>> = { regular: new Map(), semibold: new Map() }

/** Advance of one character in parts of the size, from the font that prints it. */
const advance = (character: string, weight: Weight): number => {
  const found = known[weight].get(character)
  if (found !== undefined) return found
  const codePoint = character.codePointAt(0) ?? 0
  const font = fontFor(faces()[weight], codePoint)
  const width = font ? font.glyphForCodePoint(codePoint).advanceWidth / font.unitsPerEm : 0
  known[weight].set(character, width)
  return width
}

/** Width in points of a text set in the report's family, without kerning. */
export const measure = (text: string, size: number, weight: Weight = 'regular'): number => {
  let sum = 0
  for (const character of text) sum += advance(character, weight)
  return sum * size
}
