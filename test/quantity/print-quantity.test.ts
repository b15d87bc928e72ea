import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { displayUnits } from '@/lib/quantity/display-units'
import { formatNumber } from '@/lib/quantity/format-number'
import { parseQuantity } from '@/lib/quantity/parse-quantity'
import { type PrintOptions, printQuantity } from '@/lib/quantity/print-quantity'
import { type QuantityName, quantityNames } from '@/lib/quantity/quantity-name'
import { quantityRange } from '@/lib/quantity/quantity-range'

const printed = (si: number, quantity: QuantityName, options?: PrintOptions) =>
  printQuantity(si, quantity, options).replaceAll('\u2009', ' ')

const readBack = (text: string, quantity: QuantityName) => {
  const outcome = parseQuantity(text, quantity)
  if (!outcome.ok) throw new Error(`${text}: ${outcome.message}`)
  return outcome.si
}

describe('values are printed in the unit an engineer would choose', () => {
  test.each<[number, QuantityName, string]>([
    [11_000, 'voltage', '11 kV'],
    [400, 'voltage', '400 V'],
    [32_400, 'voltage', '32.4 kV'],
    [118.2, 'current', '118.2 A'],
    [8e6, 'apparent-power', '8 MVA'],
    [800e3, 'apparent-power', '800 kVA'],
    [1.1e6, 'active-power', '1100 kW'],
    [-180e3, 'reactive-power', '−180 kvar'],
    [0.000246, 'impedance-per-length', '0.246 Ω/km'],
    [0.0053, 'impedance', '5.3 mΩ'],
    [(992 * Math.PI) / 30, 'speed', '992 r/min'],
    [340, 'inertia', '340 kg·m²'],
    [10_589, 'torque', '10 589 N·m'],
    [0.05, 'time', '50 ms'],
    [12, 'time', '12 s'],
    [2400, 'time', '40 min'],
    [0.85, 'ratio', '0.85'],
    [0, 'time', '0 s'],
    [0, 'impedance', '0 Ω'],
  ])('%d %s', (si, quantity, expected) => {
    expect(printed(si, quantity)).toBe(expected)
  })

  test('the unit stands behind a thin space and a minus is a minus sign', () => {
    expect(printQuantity(-0.05, 'ratio', { unit: '%' })).toBe('\u22125\u2009%')
  })

  test('a value that rounds up to a thousand takes the next unit', () => {
    expect(printed(999.99996, 'voltage')).toBe('1 kV')
    expect(printed(999.96, 'voltage', { digits: 4 })).toBe('1.000 kV')
  })

  test('asked-for digits and decimals keep their zeros', () => {
    expect(printed(0.035, 'ratio', { unit: '%', decimals: 2 })).toBe('3.50 %')
    expect(printed(11_000, 'voltage', { digits: 3 })).toBe('11.0 kV')
    expect(printed(1_104_000, 'active-power', { digits: 3 })).toBe('1104 kW')
  })

  test('US units from the same data', () => {
    expect(printed(745_699.87, 'active-power', { system: 'US', digits: 4 })).toBe('1000 hp')
    expect(printed(10.535, 'inertia', { system: 'US', digits: 4 })).toBe('250.0 lb·ft²')
    expect(printed(338.954, 'torque', { system: 'US', digits: 4 })).toBe('250.0 lb·ft')
    expect(printed(304.8, 'length', { system: 'US' })).toBe('1000 ft')
    expect(printed(11_000, 'voltage', { system: 'US' })).toBe('11 kV')
  })

  test('a unit that the quantity is not printed in is a mistake of the program', () => {
    expect(() => printQuantity(1, 'voltage', { unit: 'hp' })).toThrow(RangeError)
  })

  test('what is not finite prints as a dash', () => {
    expect(printQuantity(Number.NaN, 'voltage')).toBe('–')
    expect(formatNumber(Number.POSITIVE_INFINITY)).toBe('–')
  })

  test('a small negative number that rounds to nothing has no minus', () => {
    expect(formatNumber(-0.0004, { decimals: 2 })).toBe('0.00')
  })
})

describe('parse and print are inverse', () => {
  const value = (quantity: QuantityName) => {
    const { sign, least, most } = quantityRange[quantity]
    const size = fc
      .double({ min: Math.log10(least * 1.01), max: Math.log10(most * 0.98), noNaN: true })
      .map((x) => 10 ** x)
    return sign === 'any' ? fc.tuple(size, fc.boolean()).map(([x, negative]) => (negative ? -x : x)) : size
  }
  const quantityAndValue = fc
    .constantFrom(...quantityNames)
    .chain((quantity) => fc.tuple(fc.constant(quantity), value(quantity)))

  test('parse(print(q)) = q with all digits, in both systems of units', () => {
    fc.assert(
      fc.property(quantityAndValue, fc.constantFrom('SI' as const, 'US' as const), ([quantity, si], system) => {
        const back = readBack(printQuantity(si, quantity, { digits: 15, system }), quantity)
        expect(Math.abs(back - si)).toBeLessThanOrEqual(1e-13 * Math.abs(si))
      }),
      { numRuns: 1000 },
    )
  })

  test('what is printed once is printed the same after reading it', () => {
    fc.assert(
      fc.property(quantityAndValue, ([quantity, si]) => {
        const text = printQuantity(si, quantity)
        expect(printQuantity(readBack(text, quantity), quantity)).toBe(text)
      }),
      { numRuns: 1000 },
    )
  })

  test('every unit that is printed is read with the same factor', () => {
    for (const quantity of quantityNames)
      for (const system of ['SI', 'US'] as const)
        for (const unit of displayUnits(quantity, system)) {
          const { most, least } = quantityRange[quantity]
          const count = Math.min(Math.max(1, (10 * least) / unit.factor), most / unit.factor)
          const si = count * unit.factor
          expect(readBack(printQuantity(si, quantity, { unit: unit.label, digits: 15 }), quantity) / si).toBeCloseTo(
            1,
            13,
          )
        }
  })
})
