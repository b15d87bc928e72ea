import fc from 'fast-check'
import { describe, expect, test } from 'vitest'
import { parseQuantity } from '@/lib/quantity/parse-quantity'
import { type NumberStyle, type QuantityName, quantityNames } from '@/lib/quantity/quantity-name'

const understood = (text: string, quantity: QuantityName, style?: NumberStyle) => {
  const outcome = parseQuantity(text, quantity, style)
  if (!outcome.ok) throw new Error(`${text}: ${outcome.message}`)
  return outcome
}
const si = (text: string, quantity: QuantityName, style?: NumberStyle) => understood(text, quantity, style).si
const refusal = (text: string, quantity: QuantityName) => {
  const outcome = parseQuantity(text, quantity)
  return outcome.ok ? `accepted as ${outcome.reading}` : outcome.message
}

describe('electrical values are read in every usual spelling', () => {
  test.each<[string, QuantityName, number]>([
    ['11kV', 'voltage', 11_000],
    ['11 KV', 'voltage', 11_000],
    ['400 V', 'voltage', 400],
    ['0.4 kV', 'voltage', 400],
    ['8 kA', 'current', 8000],
    ['651 A', 'current', 651],
    ['25 MVA', 'apparent-power', 25e6],
    ['800 kva', 'apparent-power', 800e3],
    ['1100 kW', 'active-power', 1.1e6],
    ['0.3 MW', 'active-power', 3e5],
    ['0.3 mw', 'active-power', 3e5],
    ['1.2 Mvar', 'reactive-power', 1.2e6],
    ['−180 kVAr', 'reactive-power', -180e3],
    ['0.35 Ω', 'impedance', 0.35],
    ['0.35 Ω', 'impedance', 0.35],
    ['35 mΩ', 'impedance', 0.035],
    ['0.35 ohm', 'impedance', 0.35],
    ['0.246 Ω/km', 'impedance-per-length', 0.000246],
    ['0.246 ohm per km', 'impedance-per-length', 0.000246],
    ['60 µS/km', 'susceptance-per-length', 6e-8],
    ['60 uS/km', 'susceptance-per-length', 6e-8],
    ['50 Hz', 'frequency', 50],
  ])('%s as %s', (text, quantity, expected) => {
    expect(si(text, quantity)).toBe(expected)
  })

  test('ohms per thousand feet are the same by all three spellings', () => {
    const expected = 0.075 / 304.8
    for (const text of ['0.075 ohm/kft', '0.075 Ω/1000 ft', '0.075 ohm per 1000 feet'])
      expect(si(text, 'impedance-per-length')).toBeCloseTo(expected, 15)
  })
})

describe('mechanical values are read in every usual spelling', () => {
  test('speed in r/min, rpm and rev/min is 2π/60 rad/s each', () => {
    for (const text of ['992 r/min', '992rpm', '992 rev/min', '992 min⁻¹', '992 1/min']) {
      expect(si(text, 'speed')).toBeCloseTo((992 * Math.PI) / 30, 11)
    }
  })

  test('pounds and feet are a torque, pounds and square feet an inertia', () => {
    // 1 lb·ft = 1.35582 N·m, 1 lb·ft² = 0.0421401 kg·m²: common conversion tables.
    for (const text of ['250 lb·ft', '250 ft-lb', '250 lbf·ft', '250 lb-ft', '250 lbft'])
      expect(si(text, 'torque') / 250).toBeCloseTo(1.35582, 5)
    for (const text of ['250 lb·ft²', '250 lb.ft2', '250 lb-ft^2', '250 lbft2', 'Wk2 250 lb·ft²', 'WR² = 250 lb·ft²'])
      expect(si(text, 'inertia') / 250).toBeCloseTo(0.0421401, 7)
  })

  test('GD² is four times the inertia, in kgf·m², kg·m² or N·m²', () => {
    expect(si('GD² 1360 kgf·m²', 'inertia')).toBe(340)
    expect(si('GD2 480 kgf·m²', 'inertia')).toBe(120)
    expect(si('480 kgf·m² (GD²)', 'inertia')).toBe(120)
    expect(si('GD²=480kgm2', 'inertia')).toBe(120)
    expect(si('GD² 9806.65 N·m²', 'inertia')).toBeCloseTo(250, 9)
    expect(si('J 340 kg·m²', 'inertia')).toBe(340)
  })

  test('a weight times a length squared without GD² is asked about, not guessed', () => {
    expect(refusal('480 kgf·m²', 'inertia')).toBe(
      'Say which inertia this is: write GD² in front of it, or give J in kg·m².',
    )
  })

  test('horsepower is 550 ft·lbf/s and the metric one 75 kgf·m/s', () => {
    expect(si('1 hp', 'active-power')).toBeCloseTo(745.699871582, 8)
    expect(si('1 PS', 'active-power')).toBeCloseTo(735.49875, 9)
  })

  test('times in ms, s, min and h', () => {
    expect([si('50 ms', 'time'), si('12 s', 'time'), si('40 min', 'time'), si('2 h', 'time')]).toEqual([
      0.05, 12, 2400, 7200,
    ])
  })
})

describe('numbers with separators', () => {
  test.each([
    ['1 250,5 kW', 1250.5],
    ['1,250.5 kW', 1250.5],
    ['1.250,5 kW', 1250.5],
    ["1'250.5 kW", 1250.5],
    ['1 250,5 kW', 1250.5],
    ['1,250,000 kW', 1_250_000],
    ['1.250.000 kW', 1_250_000],
    ['1,5 kW', 1.5],
    ['0,246 kW', 0.246],
    ['1250,500 kW', 1250.5],
    ['1.2e3 kW', 1200],
    ['1,2·10³ kW', 1200],
    ['1.2 × 10^3 kW', 1200],
    ['+5 kW', 5],
    ['.5 kW', 0.5],
  ])('%s', (text, kilowatt) => {
    const read = understood(text, 'active-power')
    expect(read.si).toBeCloseTo(kilowatt * 1000, 6)
    expect(read.ambiguous).toBe(false)
  })

  test('one separator before exactly three digits is read by the number style and said to be ambiguous', () => {
    expect(understood('1,250 kW', 'active-power', 'point')).toMatchObject({ si: 1_250_000, ambiguous: true })
    expect(understood('1,250 kW', 'active-power', 'comma')).toMatchObject({ si: 1250, ambiguous: true })
    expect(understood('1.250 kW', 'active-power', 'point')).toMatchObject({ si: 1250, ambiguous: true })
    expect(understood('1.250 kW', 'active-power', 'comma')).toMatchObject({ si: 1_250_000, ambiguous: true })
  })

  test.each(['1.2.3 kW', '12 34 kW', '1,25,000 kW', '1.250,5.0 kW', '1,250 500.5 kW'])('%s is refused', (text) => {
    expect(refusal(text, 'active-power')).toContain('separators')
  })
})

describe('ratios and plain numbers', () => {
  test('percent, per unit and × are understood, and a bare number', () => {
    expect(si('6 %', 'ratio')).toBe(0.06)
    expect(si('−2.5%', 'ratio')).toBe(-0.025)
    expect(si('0.85', 'ratio')).toBe(0.85)
    expect(si('1.05 pu', 'ratio')).toBe(1.05)
    expect(si('1.05 p.u.', 'ratio')).toBe(1.05)
    expect(si('5.5 ×', 'ratio')).toBe(5.5)
    expect(si('6', 'number')).toBe(6)
  })
})

describe('what cannot be is refused with what to do', () => {
  test.each<[string, QuantityName, string]>([
    ['', 'voltage', 'Type a value, for example 11 kV.'],
    ['   ', 'voltage', 'Type a value, for example 11 kV.'],
    ['11', 'voltage', 'Add a unit, for example 11 kV.'],
    ['0', 'length', 'Add a unit, for example 0.8 km.'],
    ['-11 kV', 'voltage', 'A voltage must be above zero.'],
    ['0 kV', 'voltage', 'A voltage must be above zero.'],
    ['-3 kg·m²', 'inertia', 'An inertia cannot be negative.'],
    ['-3 m', 'length', 'A length cannot be negative.'],
    ['1e999 kV', 'voltage', 'This number is too large; write for example 11 kV.'],
    ['25 MW', 'apparent-power', 'MW is not a unit of apparent power; write for example 8 MVA.'],
    ['25 MVA', 'active-power', 'MVA is not a unit of active power; write for example 1100 kW.'],
    ['11 kV ± 5 %', 'voltage', 'Write one number with one unit, for example 11 kV.'],
    ['6 poles', 'number', 'Write a plain number, for example 6.'],
  ])('“%s” as %s', (text, quantity, message) => {
    expect(refusal(text, quantity)).toBe(message)
  })

  test.each<[string, QuantityName]>([
    ['11 GV', 'voltage'],
    ['90 000 000 MVA', 'apparent-power'],
    ['3e9 kg·m²', 'inertia'],
  ])('%s is more than a plant can have', (text, quantity) => {
    expect(refusal(text, quantity)).toMatch(/too large for .* here \(at most .*\); check the number and its unit\.$/)
  })

  test('a milli where a mega was meant is caught as too small', () => {
    expect(refusal('11 mV', 'voltage')).toContain('too small')
    expect(refusal('0.3 mW', 'active-power')).toContain('too small')
  })

  test.each(['abc', 'NaN', 'Infinity kV', '-', ',', 'kV 11', '--5 kV', '=1+1', '<script>'])(
    '%s is no number',
    (text) => {
      expect(refusal(text, 'voltage')).toMatch(/does not start with a number/)
    },
  )

  test('any text whatever is read or refused in one sentence, never a failure', () => {
    fc.assert(
      fc.property(
        fc.string({ unit: 'grapheme', maxLength: 120 }),
        fc.constantFrom(...quantityNames),
        (text, quantity) => {
          const outcome = parseQuantity(text, quantity)
          return outcome.ok ? Number.isFinite(outcome.si) : /^[^\n]+\.$/.test(outcome.message)
        },
      ),
      { numRuns: 1000 },
    )
  })

  test('a number with any run of unit letters is read or refused, never a failure', () => {
    const letters = fc.array(fc.constantFrom(...'kMmVAWhpΩ²/·.^-23 lbfgtNsrinHzµGD%×'), { maxLength: 10 })
    fc.assert(
      fc.property(letters, fc.constantFrom(...quantityNames), (unit, quantity) => {
        const outcome = parseQuantity(`12.5 ${unit.join('')}`, quantity)
        return outcome.ok ? Number.isFinite(outcome.si) : outcome.message.endsWith('.')
      }),
      { numRuns: 2000 },
    )
  })
})

describe('the reading says how a value was understood', () => {
  test.each<[string, QuantityName, string]>([
    ['11kV', 'voltage', '11 kV'],
    ['0.012 MW', 'active-power', '0.012 MW'],
    ['250 lb·ft²', 'inertia', '10.535 kg·m² (from 250 lb·ft²)'],
    ['GD2 480 kgf·m²', 'inertia', '120 kg·m² (from GD² 480 kgf·m²)'],
    ['500 hp', 'active-power', '372.85 kW (from 500 hp)'],
    ['1,250 kW', 'active-power', '1250 kW'],
    ['12.3456789 kV', 'voltage', '12.3456789 kV'],
    ['-5 %', 'ratio', '−5 %'],
  ])('%s', (text, quantity, reading) => {
    expect(understood(text, quantity).reading.replaceAll('\u2009', ' ')).toBe(reading)
  })

  test('a reading is read back as the same value', () => {
    for (const text of ['11kV', '1 250,5 V', '400 v'])
      expect(si(understood(text, 'voltage').reading, 'voltage')).toBe(si(text, 'voltage'))
  })
})
