import { createRequire } from 'node:module'
import { type Font, openSync } from 'fontkit'

export type Weight = 'regular' | 'semibold'

/** A family member with the one that lends it the glyphs it lacks. */
export interface Face {
  own: Font
  fallback: Font
}

const require = createRequire(import.meta.url)

const open = (file: string): Font => {
  const font = openSync(require.resolve(file))
  if (!('glyphForCodePoint' in font)) throw new Error(`${file} is a collection, not a font.`)
  return font
}

const load = (): Record<Weight, Face> => ({
  regular: {
    own: open('source-sans/TTF/SourceSans3-Regular.ttf'),
    fallback: open('dejavu-fonts-ttf/ttf/DejaVuSans.ttf'),
  },
  semibold: {
    own: open('source-sans/TTF/SourceSans3-Semibold.ttf'),
    fallback: open('dejavu-fonts-ttf/ttf/DejaVuSans-Bold.ttf'),
  },
})

let loaded: Record<Weight, Face> | null = null

/** The faces of the report, read once a process. */
export const faces = (): Record<Weight, Face> => {
  loaded ??= load()
  return loaded
}

/** The font that has a glyph for the character; null when neither has. */
export const fontFor = (face: Face, codePoint: number): Font | null => {
  if (face.own.hasGlyphForCodePoint(codePoint)) return face.own
  return face.fallback.hasGlyphForCodePoint(codePoint) ? face.fallback : null
}
