import type { PDFDocument, PDFRef } from '@cantoo/pdf-lib'
import * as fontkit from 'fontkit'

/** Latin with all European and Vietnamese letters, Greek, Cyrillic, dashes, quotes: what names and dates are written in. */
const ranges = [
  [0x20, 0x7e],
  [0xa1, 0x24f],
  [0x370, 0x3ff],
  [0x400, 0x45f],
  [0x1e80, 0x1ef9],
  [0x2010, 0x2026],
] as const

/**
 * Embeds a subset of a TrueType font once, before any signature, so that signing later needs no font file and brings no font of its own. Ligatures are left out: each character is looked up alone.
 */
export async function embedSealFont(document: PDFDocument, trueType: Uint8Array): Promise<PDFRef> {
  document.registerFontkit(fontkit)
  const font = await document.embedFont(trueType, { subset: true, customName: 'SIGNOF+SourceSans3-Regular' })
  const known = new Set(font.getCharacterSet())
  // Characters can share a glyph, which then stands for the one named first: plain letters come first.
  for (const [first, last] of ranges) {
    for (let point = first; point <= last; point += 1)
      if (known.has(point)) font.encodeText(String.fromCodePoint(point))
  }
  return font.ref
}
