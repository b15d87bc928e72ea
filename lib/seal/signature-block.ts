import type { SealFont } from './seal-font'

/** What the block of one signature says on paper. */
export interface SignatureBlock {
  readonly role: string
  readonly name: string
  /** Printed instead of the name when the font lacks one of its letters: a wrong letter is worse than another way to say who it is. */
  readonly email: string
  readonly at: Date
  /** SHA-256 of the certificate, hexadecimal. */
  readonly fingerprint: string
}

interface Line {
  readonly text: string
  readonly size: number
  readonly colour: string
}

const ink = '0.09 0.129 0.169'
const soft = '0.298 0.345 0.4'
const accent = '0.043 0.353 0.388'
const margin = 5
const leading = 1.25

/**
 * Draws the block as a PDF content stream for a box of the given size in points; text that is too wide or too high is set smaller.
 * Source of the operators: ISO 32000-1, sections 8.4 and 9.4.
 */
export function drawSignatureBlock(
  block: SignatureBlock,
  font: SealFont,
  fontName: string,
  width: number,
  height: number,
): string {
  const lines = linesOf(block, font)
  const needed = lines.reduce((sum, line) => sum + line.size * leading, 0)
  const scale = Math.min(1, height / needed)
  const drawing = [`${accent} rg 0 0 1.2 ${fixed(height)} re f`, 'BT']
  let baseline = (height + needed * scale) / 2
  for (const { text, size, colour } of lines) {
    const fitted = Math.min(size * scale, (width - 2 * margin) / widthOf(text, font))
    baseline -= size * scale * leading
    const rise = baseline + size * scale * (leading - 1)
    drawing.push(
      `${colour} rg /${fontName} ${fixed(fitted)} Tf 1 0 0 1 ${margin} ${fixed(rise)} Tm <${encode(text, font)}> Tj`,
    )
  }
  return [...drawing, 'ET'].join('\n')
}

function linesOf({ role, name, email, at, fingerprint }: SignatureBlock, font: SealFont): Line[] {
  const plain = name
    .normalize('NFC')
    .replace(/\u00a0/g, ' ')
    .replace(/[\u2010\u2011]/g, '-')
  const printable = [...plain].every((character) => font.has(character))
  const short = fingerprint
    .slice(0, 16)
    .toUpperCase()
    .replace(/.{4}(?=.)/g, '$& ')
  return [
    { text: role, size: 6.5, colour: soft },
    { text: printable ? plain : email, size: 10, colour: ink },
    { text: `${at.toISOString().slice(0, 16).replace('T', ' ')} UTC`, size: 7, colour: ink },
    { text: `Certificate ${short}`, size: 6.5, colour: soft },
  ]
}

/** Width in ems. */
function widthOf(text: string, font: SealFont): number {
  return [...text].reduce((sum, character) => sum + glyph(character, font).width, 0) / 1000
}

const encode = (text: string, font: SealFont) => [...text].map((character) => glyph(character, font).code).join('')

function glyph(character: string, font: SealFont) {
  const found = font.get(character)
  if (found) return found
  throw new Error(`the font of signature blocks lacks ${JSON.stringify(character)}`)
}

const fixed = (value: number) => String(Math.round(value * 100) / 100)
