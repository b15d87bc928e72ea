import type { NumberStyle } from './quantity-name'

export type ReadNumber =
  | { ok: true; value: number; rest: string; ambiguous: boolean }
  | { ok: false; problem: 'no-number' | 'separators' | 'too-large' }

const shape =
  /^([+-] ?)?((?:\d|[.,]\d|[ ']\d{3}(?!\d))(?:\d|[.,']\d| \d{3}(?!\d))*[.,]?)(?:[eE]([+-]?\d{1,4})(?![\p{L}\d])| ?[·×*x] ?10\^([+-]?\d{1,4}))?/u

const grouped = (text: string): boolean => /^\d{1,3}(?:\D\d{3})+$/.test(text)

/** Digits with separators brought to the machine's notation; null when the separators make no sense. */
const plainDigits = (text: string, style: NumberStyle): { digits: string; ambiguous: boolean } | null => {
  const separators = [...text.matchAll(/[.,]/g)].map((match) => match[0])
  const spaced = /[ ']/.test(text)
  const last = separators.at(-1)
  if (last === undefined)
    return spaced && !grouped(text) ? null : { digits: text.replace(/[ ']/g, ''), ambiguous: false }

  const at = text.lastIndexOf(last)
  const whole = text.slice(0, at)
  const fraction = text.slice(at + 1)
  const asDecimal = { digits: `${whole.replace(/[ '.,]/g, '')}.${fraction}`, ambiguous: false }
  if (/[ ']/.test(fraction)) return null
  if (separators.length > 1) {
    const other = separators.some((separator) => separator !== last)
    if (!other) return !spaced && grouped(text) ? { digits: text.replace(/[.,]/g, ''), ambiguous: false } : null
    // `1,250.5`: one kind groups, the last one is the decimal sign and may stand once.
    return !spaced && separators.indexOf(last) === separators.length - 1 && grouped(whole) ? asDecimal : null
  }
  if (spaced) return grouped(whole) ? asDecimal : null
  if (fraction.length === 3 && /^[1-9]\d{0,2}$/.test(whole)) {
    const decimal = (style === 'point') === (last === '.')
    return { digits: decimal ? asDecimal.digits : whole + fraction, ambiguous: true }
  }
  return asDecimal
}

/**
 * The number at the start of a text in plain notation, and what follows it. One separator before exactly three digits
 * (`1,250`) can be read in two ways: the style decides and the reading is marked ambiguous.
 */
export const readNumber = (text: string, style: NumberStyle): ReadNumber => {
  const match = shape.exec(text)
  if (!match) return { ok: false, problem: 'no-number' }
  const rest = text.slice(match[0].length)
  // `12 34 kW` or `1.2.3`: digits left over mean that the separators were not understood.
  if (/^ ?[.,']?\d/.test(rest) && !/^ 1 ?\//.test(rest)) return { ok: false, problem: 'separators' }
  const plain = plainDigits(match[2] ?? '', style)
  if (!plain) return { ok: false, problem: 'separators' }
  const exponent = match[3] ?? match[4]
  const size = Number(exponent === undefined ? plain.digits : `${plain.digits}e${exponent}`)
  if (!Number.isFinite(size)) return { ok: false, problem: 'too-large' }
  const negative = match[1]?.startsWith('-') ?? false
  return { ok: true, value: negative ? -size : size, rest: rest.trim(), ambiguous: plain.ambiguous }
}
