import { createRequire } from 'node:module'
import { openSync } from 'fontkit'
import { describe, expect, test } from 'vitest'
import { textWidth } from '@/lib/drawing/text-width'

const require = createRequire(import.meta.url)

const font = (weight: string) => {
  const opened = openSync(require.resolve(`source-sans/TTF/SourceSans3-${weight}.ttf`))
  if (!('glyphForCodePoint' in opened)) throw new Error('not a font')
  return opened
}

describe('widths of the drawing type', () => {
  test.each([
    ['regular', 'Regular'],
    ['semibold', 'Semibold'],
  ] as const)('agree with the font file, %s', (weight, file) => {
    const opened = font(file)
    const words = 'deepest 31.27 kV, change −3.48 % at 0.30 s · Ω ≤ ² Δ φ MÄRZ'
    const sum = [...words].reduce((total, c) => total + opened.glyphForCodePoint(c.codePointAt(0)!).advanceWidth, 0)
    expect(textWidth(words, 1000, weight)).toBeCloseTo(sum, 0)
  })

  test('all digits and the minus are equally wide, so that columns of figures align', () => {
    const widths = [...'0123456789−'].map((character) => textWidth(character, 1000))
    expect(new Set(widths).size).toBe(1)
  })
})
