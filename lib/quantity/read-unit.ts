import { findUnitWords } from './unit-words'

/** A typed unit: as it is printed, and in the words of the unit parser. */
export interface ReadUnit {
  label: string
  expression: string
}

const raised: Record<string, string> = { '-1': '⁻¹', '-2': '⁻²', 1: '', 2: '²', 3: '³' }

/** One factor such as `ft^2`, `m2`, `min^-1`. */
const factor = (text: string): ReadUnit | null => {
  const match = /^(\p{L}+)(?:\^?(-?[123]))?$/u.exec(text)
  const words = match && findUnitWords(match[1] ?? '')
  if (!words) return null
  const power = match[2] ?? '1'
  return {
    label: words.map((word) => word.label).join('·') + raised[power],
    expression: words.map((word) => word.expression).join('*') + (power === '1' ? '' : `^${power}`),
  }
}

const product = (text: string): ReadUnit | null => {
  const factors = text.split('·').map(factor)
  const known = factors.filter((part) => part !== null)
  if (known.length !== factors.length) return null
  return {
    label: known.map((part) => part.label).join('·'),
    expression: known.map((part) => part.expression).join('*'),
  }
}

/** Unit text in plain notation, for example `lb.ft2`, `ohm/1000 ft`, `kg·m^2`, `r/min`; null when a word is not known. */
export const readUnit = (text: string): ReadUnit | null => {
  if (/^(?:rpm|1 ?\/ ?min|min ?\^?-1)$/i.test(text)) return { label: 'r/min', expression: 'cycle/minute' }
  const separated = text
    .replace(/ ?(?:\/|\bper\b) ?/g, '/')
    .replace(/\/1[ ,.']?000 ?(ft|feet|m|metres|meters)$/i, (_all, unit: string) => (/^f/i.test(unit) ? '/kft' : '/km'))
    .replace(/(\p{L})-(?=\p{L})/gu, '$1·')
    .replace(/ ?[·.*×] ?/g, '·')
    .replace(/ /g, '·')
  const [above = '', ...below] = separated.split('/')
  const parts = [above, ...below].map(product)
  const known = parts.filter((part) => part !== null)
  if (known.length !== parts.length) return null
  return {
    label: known.map((part) => part.label).join('/'),
    expression: known.map((part) => part.expression).join('/'),
  }
}
