import { isFloor } from '../../engine/criteria/envelope'
import type { CloseMargins, NotAssessedReason, RuleQuantity, Verdict, VerdictWord } from '../../engine/criteria/rule'
import { formatNumber } from '../../quantity/format-number'
import { notAssessedReasons } from './verdict-words'

/** How a quantity prints: its unit, SI units in one of it, usual decimals of a value and least decimals of a limit. */
interface Print {
  unit: string
  factor: number
  decimals: number
  limitDecimals: number
}

const percent: Print = { unit: '%', factor: 0.01, decimals: 2, limitDecimals: 1 }
const wholePercent: Print = { unit: '%', factor: 0.01, decimals: 1, limitDecimals: 0 }
const perUnit: Print = { unit: 'pu', factor: 1, decimals: 3, limitDecimals: 2 }
const severity: Print = { unit: '', factor: 1, decimals: 2, limitDecimals: 1 }
const seconds: Print = { unit: 's', factor: 1, decimals: 2, limitDecimals: 0 }

const prints: Record<RuleQuantity, Print> = {
  'voltage-change': percent,
  'remaining-voltage': perUnit,
  'highest-voltage': perUnit,
  'run-up-time': seconds,
  'accelerating-torque': wholePercent,
  'heat-used': wholePercent,
  'flicker-short-term': severity,
  'flicker-long-term': severity,
  'trip-margin': seconds,
  'thermal-margin': seconds,
}

/** More decimals than a double holds of these figures. */
const mostDecimals = 12

const rounded = (value: number, decimals: number): number => Number(value.toFixed(decimals))

/** The word that a reader would find with the printed figures alone. */
const wordOfPrinted = (
  value: number,
  limit: number,
  quantity: RuleQuantity,
  margins: CloseMargins,
  { factor }: Print,
): VerdictWord => {
  // Differences of printed decimals carry binary dust; a margin of exactly the close width is not close.
  const margin = Number((isFloor(quantity) ? value - limit : limit - value).toFixed(mostDecimals))
  if (margin < 0) return 'fails'
  const voltage = quantity === 'remaining-voltage' || quantity === 'highest-voltage'
  const width = voltage ? margins.voltage / factor : margins.ofLimit * Math.abs(limit)
  return margin < Number(width.toFixed(mostDecimals)) ? 'close' : 'meets'
}

/** Decimals that show a limit in full, no fewer than usual. */
const limitDecimals = (limit: number, { limitDecimals: least }: Print): number => {
  for (let decimals = least; decimals < mostDecimals; decimals += 1)
    if (Math.abs(rounded(limit, decimals) - limit) < 1e-9 * Math.max(1, Math.abs(limit))) return decimals
  return mostDecimals
}

/** Value, limit and margin of a verdict as texts without and with their unit; null where there is no figure. */
export interface FormattedVerdict {
  value: string | null
  limit: string
  margin: string | null
  unit: string
}

/**
 * A verdict's figures at as many decimals as it takes so that value, limit and word never seem to disagree: a value
 * that fails by a hair does not print as the limit, one that is just close does not print as if it met by the margin.
 */
export const formatVerdict = (
  { value, limit, word }: Pick<Verdict, 'value' | 'limit' | 'word'>,
  quantity: RuleQuantity,
  margins: CloseMargins,
): FormattedVerdict => {
  const print = prints[quantity]
  const bar = limit / print.factor
  const barDecimals = limitDecimals(bar, print)
  const limitText = formatNumber(bar, { decimals: barDecimals })
  if (value === null) return { value: null, limit: limitText, margin: null, unit: print.unit }
  const figure = value / print.factor
  const printedBar = rounded(bar, barDecimals)
  let decimals = Math.max(print.decimals, barDecimals)
  while (
    decimals < mostDecimals &&
    wordOfPrinted(rounded(figure, decimals), printedBar, quantity, margins, print) !== word
  )
    decimals += 1
  const printed = rounded(figure, decimals)
  const margin = isFloor(quantity) ? printed - printedBar : printedBar - printed
  return {
    value: formatNumber(printed, { decimals }),
    limit: limitText,
    margin: formatNumber(margin, { decimals }),
    unit: print.unit,
  }
}

/** `3.48 % (at most 4.0 %)`; where there is no figure, why. */
export const verdictFigure = (
  formatted: FormattedVerdict,
  quantity: RuleQuantity,
  reason: NotAssessedReason | null,
): string => {
  const side = isFloor(quantity) ? 'at least' : 'at most'
  const unit = formatted.unit === '' ? '' : `\u2009${formatted.unit}`
  const none = reason === null ? 'not reached' : notAssessedReasons[reason]
  return `${formatted.value === null ? none : formatted.value + unit} (${side} ${formatted.limit}${unit})`
}
