import fc from 'fast-check'
import { expect, test } from 'vitest'
import type { CloseMargins, RuleQuantity, VerdictWord } from '@/lib/engine/criteria/rule'
import { formatVerdict, verdictFigure } from '@/lib/study/words/format-verdict'
import { perUnit } from '@/lib/units/si'

const margins: CloseMargins = { ofLimit: perUnit(0.1), voltage: perUnit(0.01) }

/** The word by unrounded figures, as the limits of the study are judged. */
const judged = (value: number, limit: number, quantity: RuleQuantity): VerdictWord => {
  const margin = quantity === 'remaining-voltage' || quantity === 'accelerating-torque' ? value - limit : limit - value
  if (margin < 0) return 'fails'
  const voltage = quantity === 'remaining-voltage' || quantity === 'highest-voltage'
  return margin < (voltage ? margins.voltage : margins.ofLimit * limit) ? 'close' : 'meets'
}
const format = (value: number, limit: number, quantity: RuleQuantity) =>
  formatVerdict({ value, limit, word: judged(value, limit, quantity) }, quantity, margins)

test('a plain verdict prints at the usual digits', () => {
  expect(format(0.034774, 0.04, 'voltage-change')).toEqual({ value: '3.48', limit: '4.0', margin: '0.52', unit: '%' })
  expect(format(0.8617, 0.8, 'remaining-voltage')).toEqual({
    value: '0.862',
    limit: '0.80',
    margin: '0.062',
    unit: 'pu',
  })
  expect(format(10.378, 20, 'run-up-time')).toEqual({ value: '10.38', limit: '20', margin: '9.62', unit: 's' })
  expect(verdictFigure(format(0.16, 0.1, 'accelerating-torque'), 'accelerating-torque', null)).toBe(
    '16.0\u2009% (at least 10\u2009%)',
  )
})

test('a value that fails by a hair does not print as the limit', () => {
  expect(format(0.040003, 0.04, 'voltage-change')).toMatchObject({ value: '4.0003', margin: '−0.0003' })
  expect(format(0.79996, 0.8, 'remaining-voltage')).toMatchObject({ value: '0.79996' })
})

test('a value that is only just close does not print as if it met by the margin', () => {
  expect(format(0.036001, 0.04, 'voltage-change')).toMatchObject({ value: '3.6001', margin: '0.3999' })
  expect(format(0.036, 0.04, 'voltage-change')).toMatchObject({ value: '3.60' })
})

test('a limit with more decimals than usual prints them all', () => {
  expect(format(0.03, 0.0425, 'voltage-change').limit).toBe('4.25')
})

test('a verdict without a figure says why beside its limit', () => {
  const formatted = formatVerdict({ value: null, limit: 20, word: 'fails' }, 'run-up-time', margins)
  expect(verdictFigure(formatted, 'run-up-time', null)).toBe('not reached (at most 20\u2009s)')
  expect(verdictFigure(formatted, 'run-up-time', 'case-collapsed')).toBe(
    'the voltage collapses during the start (at most 20\u2009s)',
  )
})

const number = (text: string | null) => Number((text ?? '').replaceAll('\u2009', '').replace('−', '-'))

test('whatever the figures, the printed ones lead a reader to the printed word', () => {
  const quantities: RuleQuantity[] = [
    'voltage-change',
    'remaining-voltage',
    'highest-voltage',
    'run-up-time',
    'heat-used',
  ]
  fc.assert(
    fc.property(
      fc.constantFrom(...quantities),
      fc.integer({ min: 1, max: 400 }),
      fc.double({ min: -0.2, max: 0.2, noNaN: true }),
      fc.constantFrom(0, 0.1, -0.1),
      (quantity, hundredths, spread, edge) => {
        const limit = hundredths / 100
        const value = limit * (1 + edge + spread ** 5)
        const word = judged(value, limit, quantity)
        const printed = formatVerdict({ value, limit, word }, quantity, margins)
        const scale = printed.unit === '%' ? 0.01 : 1
        const gap = Number((number(printed.limit) - number(printed.value)).toFixed(12)) * scale
        const outside = quantity === 'remaining-voltage' ? gap > 0 : gap < 0
        // Nearer to the limit than twelve decimals no digits tell a reader more.
        if (Math.abs(value - limit) > 1e-9) expect(outside).toBe(word === 'fails')
      },
    ),
  )
})
