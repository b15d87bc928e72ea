const thinSpace = '\u2009'
const minus = '\u2212'

export interface NumberFormat {
  /** Significant digits; trailing zeros are kept. Without it and without `decimals`: up to six, trailing zeros dropped. */
  digits?: number
  /** Decimal places; trailing zeros are kept. Goes before `digits`. */
  decimals?: number
}

const group = (whole: string): string => (whole.length < 5 ? whole : whole.replace(/\B(?=(\d{3})+$)/g, thinSpace))

/** Decimal places that leave so many significant digits; a whole number is never rounded to tens. */
const placesFor = (size: number, digits: number): number => {
  if (size === 0) return 0
  const exponent = Number(size.toExponential(digits - 1).split('e')[1])
  return Math.min(100, Math.max(0, digits - 1 - exponent))
}

/** A number as it is printed: decimal point, thin space between thousands from 10 000 on, real minus; `–` where it is not finite. */
export const formatNumber = (value: number, format: NumberFormat = {}): string => {
  if (!Number.isFinite(value)) return '–'
  const size = Math.abs(value)
  const places = format.decimals ?? placesFor(size, format.digits ?? 6)
  const fixed = size < 1e21 ? size.toFixed(places) : BigInt(Math.round(size)).toString()
  const free = format.decimals === undefined && format.digits === undefined
  const [whole = '0', fraction = ''] = (free && fixed.includes('.') ? fixed.replace(/\.?0+$/, '') : fixed).split('.')
  const sign = value < 0 && Number(fixed) !== 0 ? minus : ''
  return sign + group(whole) + (fraction ? `.${fraction}` : '')
}
