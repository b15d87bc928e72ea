import { namedDisplayUnit } from './display-units'
import { formatNumber } from './format-number'
import { type InertiaNotation, takeInertiaNotation } from './inertia-notation'
import { plainNotation } from './notation'
import { printQuantity } from './print-quantity'
import type { NumberStyle, QuantityName } from './quantity-name'
import { quantityRange } from './quantity-range'
import { quantityWording } from './quantity-wording'
import { readNumber } from './read-number'
import { readUnit } from './read-unit'
import { isWeightInertia, type MeasuredQuantity, siFactor } from './to-si'

export type ParseOutcome =
  | {
      ok: true
      /** Value in the SI unit of the quantity, rounded to 15 significant digits. */
      si: number
      /** How it was understood, for example `11 kV` or `10.535 kg·m² (from 250 lb·ft²)`. */
      reading: string
      /** True where the number style decided what a separator means. */
      ambiguous: boolean
    }
  | { ok: false; message: string }

const refuse = (message: string): ParseOutcome => ({ ok: false, message })

/** Factor and label of a ratio's or a bare number's unit; null where it is none. */
const ratioUnit = (text: string): { label: string; factor: number } | null => {
  const plain = text.toLowerCase().replace(/[ .]/g, '')
  if (plain === '') return { label: '', factor: 1 }
  if (plain === '%' || plain === 'percent' || plain === 'pct') return { label: '%', factor: 0.01 }
  if (plain === 'pu') return { label: 'pu', factor: 1 }
  return plain === '×' || plain === 'x' || plain === 'times' ? { label: '×', factor: 1 } : null
}

const outOfRange = (si: number, quantity: QuantityName, said: string): string | null => {
  const { sign, least, most } = quantityRange[quantity]
  const { noun } = quantityWording[quantity]
  const capital = `${noun[0]?.toUpperCase()}${noun.slice(1)}`
  if (sign === 'positive' && si <= 0) return `${capital} must be above zero.`
  if (sign === 'zero-or-positive' && si < 0) return `${capital} cannot be negative.`
  if (Math.abs(si) > most)
    return `${said} is too large for ${noun} here (at most ${printQuantity(most, quantity)}); check the number and its unit.`
  if (si !== 0 && Math.abs(si) < least) return `${said} is too small for ${noun} here; check the number and its unit.`
  return null
}

interface Typed {
  value: number
  label: string
  factor: number
  notation: InertiaNotation | null
  ambiguous: boolean
}

const significantDigits = (value: number): number => value.toExponential().replace(/e.*$/, '').replace(/\D/g, '').length

const trimmed = (number: string): string => (number.includes('.') ? number.replace(/\.?0+$/, '') : number)

/** Number and unit as typed, in our notation, with every digit that was typed. */
const inOurNotation = ({ value, label }: Typed): string => {
  const number = trimmed(formatNumber(value, { digits: Math.min(15, Math.max(6, significantDigits(value))) }))
  return label === '' ? number : `${number}\u2009${label}`
}

/** As typed where that is a unit we print in; else in our unit, with what was typed behind it. */
const readingOf = (si: number, quantity: QuantityName, typed: Typed, asTyped: string): string => {
  if (typed.label === '' || quantity === 'ratio') return asTyped
  const plain = typed.notation !== 'GD²' && namedDisplayUnit(quantity, typed.label) !== undefined
  const usual = plain && !/ft|hp/.test(typed.label)
  if (usual) return asTyped
  const named = typed.notation === null || typed.notation === 'J' ? asTyped : `${typed.notation} ${asTyped}`
  return `${printQuantity(si, quantity)} (from ${named})`
}

const accept = (quantity: QuantityName, typed: Typed): ParseOutcome => {
  // Fifteen digits take off the last bit of a conversion, so that the same text gives the same value everywhere.
  const si = Number((typed.value * typed.factor).toPrecision(15)) || 0
  if (!Number.isFinite(si))
    return refuse(`This number is too large; write for example ${quantityWording[quantity].example}.`)
  const asTyped = inOurNotation(typed)
  const problem = outOfRange(si, quantity, asTyped)
  return problem
    ? refuse(problem)
    : { ok: true, si, reading: readingOf(si, quantity, typed, asTyped), ambiguous: typed.ambiguous }
}

const measured = (
  quantity: MeasuredQuantity,
  unitText: string,
  typed: Omit<Typed, 'label' | 'factor'>,
): ParseOutcome => {
  const { noun, example } = quantityWording[quantity]
  if (unitText === '') return refuse(`Add a unit, for example ${example}.`)
  if (/[±<>~;]| (?!1[ ,.']?000 )\d/.test(unitText))
    return refuse(`Write one number with one unit, for example ${example}.`)
  const unit = readUnit(unitText)
  if (!unit) return refuse(`“${unitText}” is not a unit known here; write for example ${example}.`)
  const factor = siFactor(unit.expression, quantity, typed.notation)
  if (factor === null && quantity === 'inertia' && isWeightInertia(unit.expression))
    return refuse('Say which inertia this is: write GD² in front of it, or give J in kg·m².')
  if (factor === null)
    return refuse(`${unit.label} is not a unit of ${noun.replace(/^an? /, '')}; write for example ${example}.`)
  return accept(quantity, { ...typed, label: unit.label, factor })
}

/**
 * Reads a value as an engineer types it (`11kV`, `1 250,5 kW`, `6 %`, `GD² 1360 kgf·m²`, `250 lb.ft2`) into SI.
 * Refuses with one sentence that says what to do: no number, no unit, another quantity's unit, a sign or a size that
 * cannot be. Number style: what a lone separator before three digits means, `point` if not given.
 */
export const parseQuantity = (text: string, quantity: QuantityName, style: NumberStyle = 'point'): ParseOutcome => {
  const { example } = quantityWording[quantity]
  if (text.length > 100) return refuse(`This text is too long for a value; write for example ${example}.`)
  const plain = plainNotation(text)
  if (plain === '') return refuse(`Type a value, for example ${example}.`)
  const named = quantity === 'inertia' ? takeInertiaNotation(plain) : { notation: null, text: plain }
  const number = readNumber(named.text, style)
  if (!number.ok && number.problem === 'separators')
    return refuse(`The separators in “${plain}” do not fit together; write for example 1250.5 or 1 250,5.`)
  if (!number.ok && number.problem === 'too-large')
    return refuse(`This number is too large; write for example ${example}.`)
  if (!number.ok)
    return refuse(`“${plain}” does not start with a number; write one number with its unit, for example ${example}.`)
  const typed = { value: number.value, notation: named.notation, ambiguous: number.ambiguous }

  if (quantity !== 'ratio' && quantity !== 'number') return measured(quantity, number.rest, typed)
  const unit = ratioUnit(number.rest)
  if (!unit || (quantity === 'number' && unit.label !== '')) {
    const wanted = quantity === 'number' ? 'a plain number' : 'a plain number, %, pu or ×'
    return refuse(`Write ${wanted}, for example ${example}.`)
  }
  return accept(quantity, { ...typed, ...unit })
}
