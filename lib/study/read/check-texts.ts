import type { FieldIssue } from '../../errors'
import { parseQuantity } from '../../quantity/parse-quantity'
import { quantityNames } from '../../quantity/quantity-name'
import type { Entered } from '../document/entered'
import { walkEntered } from '../walk-entered'

/** The text of a conversion is rounded to fifteen digits; more than this apart is another value. */
const sameValue = (a: number, b: number): boolean => Math.abs(a - b) <= 1e-12 * Math.max(Math.abs(a), Math.abs(b))

const problemOf = ({ text, si, quantity, style }: Entered): string | null => {
  if (!quantityNames.includes(quantity)) return 'This quantity is not known; enter the value again.'
  const parsed = parseQuantity(text, quantity, style)
  if (!parsed.ok) return parsed.message
  return sameValue(parsed.si, si)
    ? null
    : `The text “${text}” reads as ${parsed.si} in SI units, and the record holds ${si}; enter the value again.`
}

/** Values whose text no longer reads as the value stored beside it: what prints would not be what was computed. */
export const checkTexts = (document: object): FieldIssue[] =>
  walkEntered(document).flatMap(({ path, value }) => {
    const message = problemOf(value)
    return message === null ? [] : [{ path, message }]
  })
