import fc from 'fast-check'
import Papa from 'papaparse'
import { describe, expect, test } from 'vitest'
import { csvText } from '@/lib/exchange/csv-text'

const oneColumn = (cell: string | number | null) => csvText({ name: 't', heads: ['head'], rows: [[cell]] })

describe('a text that a spreadsheet would run is made harmless', () => {
  test.each(['=1+1', '+1', '-1', '@SUM(A1)', '=cmd|" /C calc"!A0', '\t=1', '  =1', '＝1+1', '\r=1'])('%j', (cell) => {
    const [, row] = Papa.parse<string[]>(oneColumn(cell)).data
    expect(row?.[0]).toBe(`'${cell}`)
  })

  test('in heads too, where tags come in', () => {
    expect(csvText({ name: 't', heads: ['=HYPERLINK("x") voltage, kV'], rows: [] })).toMatch(/^"'=HYPERLINK/)
  })

  test('no text whatever comes out as the start of a formula', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (cell) => {
        const row = Papa.parse<string[]>(oneColumn(cell)).data[1]
        expect(row?.[0] ?? '').not.toMatch(/^\s*[=+\-@]/)
      }),
      { numRuns: 500 },
    )
  })
})

describe('numbers stay numbers', () => {
  test('negative numbers have no apostrophe', () => {
    expect(oneColumn(-3.5)).toBe('head\r\n-3.5\r\n')
  })

  test('nine digits, no sign on zero, nothing where there is no figure', () => {
    expect(oneColumn(1 / 3)).toBe('head\r\n0.333333333\r\n')
    expect(oneColumn(-0)).toBe('head\r\n0\r\n')
    const empty = csvText({ name: 't', heads: ['a', 'b'], rows: [[null, Number.NaN]] })
    expect(empty).toBe('a,b\r\n,\r\n')
  })
})

test('quotes, commas and line ends come back as they were', () => {
  const cells = ['a "quoted" tag', 'one, two', 'two\nlines', 'Ω ≤ ²']
  const text = csvText({ name: 't', heads: ['a', 'b', 'c', 'd'], rows: [cells] })
  expect(Papa.parse<string[]>(text).data[1]).toEqual(cells)
})

test('the byte order mark stands only where it is asked for', () => {
  const table = { name: 't', heads: ['Ω'], rows: [] }
  expect(csvText(table)).toBe('Ω\r\n')
  expect(csvText(table, true)).toBe('\uFEFFΩ\r\n')
})
