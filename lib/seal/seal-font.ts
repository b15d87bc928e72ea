import { PDFName, PDFNumber, PDFRef } from '@cantoo/pdf-lib'
import { inflateStream } from './inflate-stream'
import { entry, type PdfView } from './pdf-view'

/** A font that lies in the file for the blocks of later signatures: for each character its code and its width in thousandths of an em. */
export type SealFont = ReadonlyMap<string, { readonly code: string; readonly width: number }>

/** Where the font is kept: in the form's default resources, under this name. */
export const sealFontName = 'SignOff'

/** The reference to the font of signature blocks; undefined if the file was not made ready for signing. */
export function sealFontOf(view: PdfView): PDFRef | undefined {
  const resources = view.dict(entry(view.dict(entry(view.catalog, 'AcroForm')), 'DR'))
  const reference = view.dict(entry(resources, 'Font'))?.get(PDFName.of(sealFontName))
  return reference instanceof PDFRef && view.dict(reference) ? reference : undefined
}

/** Reads the font back from its own character map and widths. Source: ISO 32000-1, sections 9.7.4.3 and 9.10.3. */
export function readSealFont(view: PdfView, reference: PDFRef): SealFont {
  const font = view.dict(reference)
  const map = view.stream(entry(font, 'ToUnicode'))
  const widths = readWidths(view, entry(view.dict(view.items(entry(font, 'DescendantFonts'))[0]), 'W'))
  const characters = new Map<string, { code: string; width: number }>()
  if (!map) return characters
  const text = Buffer.from(inflateStream(map, 2 ** 20)).toString('latin1')
  for (const [, code, point] of text.matchAll(/^<([0-9a-f]{4})> <([0-9a-f]{4})>$/gim)) {
    const width = widths.get(Number.parseInt(code!, 16))
    if (width !== undefined) characters.set(String.fromCharCode(Number.parseInt(point!, 16)), { code: code!, width })
  }
  return characters
}

/** `[first [w w w] first [w …]]`: the widths by character code. */
function readWidths(view: PdfView, value: ReturnType<typeof entry>): Map<number, number> {
  const widths = new Map<number, number>()
  const items = view.items(value)
  for (let index = 0; index + 1 < items.length; index += 2) {
    const first = items[index]
    if (!(first instanceof PDFNumber)) break
    view.items(items[index + 1]).forEach((width, step) => {
      if (width instanceof PDFNumber) widths.set(first.asNumber() + step, width.asNumber())
    })
  }
  return widths
}
