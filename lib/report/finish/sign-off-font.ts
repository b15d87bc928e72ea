import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import type { PDFDocument, PDFRef } from '@cantoo/pdf-lib'
import * as fontkit from 'fontkit'

/** Letters of the names that sign: Latin with all European and Vietnamese letters, Greek, Cyrillic, dashes and quotes. */
const ranges = [
  [0x20, 0x7e],
  [0xa1, 0x24f],
  [0x370, 0x3ff],
  [0x400, 0x45f],
  [0x1e80, 0x1ef9],
  [0x2010, 0x2026],
] as const

const require = createRequire(import.meta.url)

/** Embeds the letters that signature blocks are written in, once, before any signature. */
export const embedSignOffFont = async (document: PDFDocument): Promise<PDFRef> => {
  document.registerFontkit(fontkit)
  const file = readFileSync(require.resolve('source-sans/TTF/SourceSans3-Regular.ttf'))
  const font = await document.embedFont(file, { subset: true, customName: 'SIGNOF+SourceSans3-Regular' })
  const known = new Set(font.getCharacterSet())
  for (const [first, last] of ranges) {
    for (let point = first; point <= last; point += 1)
      if (known.has(point)) font.encodeText(String.fromCodePoint(point))
  }
  return font.ref
}
