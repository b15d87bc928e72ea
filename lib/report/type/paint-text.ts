import type { Font } from 'fontkit'
import type PDFDocument from 'pdfkit'
import { type Face, faces, fontFor, type Weight } from './faces'
import { measure } from './measure'
import { printable } from './printable'
import type { Line } from './rich-text'

declare global {
  namespace PDFKit.Mixins {
    interface PDFVector {
      /** The package takes a pattern as well as one length. */
      dash(lengths: readonly number[]): this
    }
    interface PDFFont {
      /** The package takes an opened font as well; its published types know files only. */
      font(source: Font, size?: number): this
    }
  }
}

export type Pdf = InstanceType<typeof PDFDocument>

/** Stretches of text that one font can print. */
const stretches = (text: string, face: Face): { text: string; font: Font }[] => {
  const out: { text: string; font: Font }[] = []
  for (const character of text) {
    const font = fontFor(face, character.codePointAt(0) ?? 0)
    if (!font) throw new Error(`No embedded font has a glyph for ${JSON.stringify(character)}.`)
    const last = out.at(-1)
    if (last?.font === font) last.text += character
    else out.push({ text: character, font })
  }
  return out
}

export interface TextStyle {
  size: number
  weight?: Weight
  colour: string
}

/** Paints one line of text with its baseline at y. */
export const paintText = (pdf: Pdf, text: string, x: number, y: number, style: TextStyle): void => {
  const weight = style.weight ?? 'regular'
  const parts = stretches(printable(text), faces()[weight])
  let at = x
  for (const part of parts) {
    pdf.font(part.font, style.size).fillColor(style.colour)
    pdf.text(part.text, at, y, { lineBreak: false, baseline: 'alphabetic' })
    if (parts.length > 1) at += measure(part.text, style.size, weight)
  }
}

/** Paints a line of runs; `align` is where x lies on the line. */
export const paintLine = (
  pdf: Pdf,
  line: Line,
  x: number,
  y: number,
  style: { size: number; colour: string },
  align: 'left' | 'right' | 'center' = 'left',
): void => {
  const from = align === 'left' ? x : align === 'right' ? x - line.width : x - line.width / 2
  for (const run of line.runs) {
    paintText(pdf, run.text, from + run.x, y - run.rise * style.size, {
      size: style.size * run.scale,
      weight: run.weight,
      colour: style.colour,
    })
  }
}
