import fc from 'fast-check'
import { expect, test } from 'vitest'
import { canonicalBytes, canonicalJson } from '@/lib/study/canonical-json'
import { sha256Hex } from '@/lib/study/sha-256'

test('RFC 8785 section 3.2.2: the example of the standard has its canonical form', () => {
  const value = {
    numbers: [Number('333333333.33333329'), 1e30, 4.5, 2e-3, 0.000000000000000000000000001],
    string: '\u20ac$\u000F\u000aA\'\u0042\u0022\u005c\\"\u002f',
    literals: [null, true, false],
  }
  expect(canonicalJson(value)).toBe(
    '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],' +
      '"string":"€$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
  )
})

test('RFC 8785 section 3.2.3: members sort by their UTF-16 code units', () => {
  const value = {
    '\u20ac': 'Euro Sign',
    '\r': 'Carriage Return',
    '\ufb33': 'Hebrew Letter Dalet With Dagesh',
    '1': 'One',
    '\u{1f600}': 'Emoji: Grinning Face',
    '\u0080': 'Control',
    '\u00f6': 'Latin Small Letter O With Diaeresis',
  }
  const names = [...canonicalJson(value).matchAll(/"((?:\\.|[^"\\])*)":"/g)].map(([, name]) => name)
  expect(names).toEqual(['\\r', '1', '\u0080', '\u00f6', '\u20ac', '\u{1f600}', '\ufb33'])
})

test('the published digest of "abc" (FIPS 180 example) comes out', async () => {
  expect(await sha256Hex(new TextEncoder().encode('abc'))).toBe(
    'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad',
  )
})

const shuffled = (value: unknown): unknown => {
  if (Array.isArray(value)) return value.map(shuffled)
  if (typeof value !== 'object' || value === null) return value
  return Object.fromEntries(
    Object.entries(value)
      .map(([key, inner]) => [key, shuffled(inner)] as const)
      .reverse(),
  )
}

test('the order in which members were written never shows in the bytes', () => {
  fc.assert(
    fc.property(fc.jsonValue({ maxDepth: 5 }), (value) => {
      expect(canonicalBytes(shuffled(value))).toEqual(canonicalBytes(value))
    }),
  )
})

test('reading the canonical text gives the value back', () => {
  fc.assert(
    fc.property(fc.jsonValue({ maxDepth: 5 }), (value) => {
      const again = JSON.parse(canonicalJson(value)) as unknown
      expect(canonicalJson(again)).toBe(canonicalJson(value))
      expect(again).toEqual(JSON.parse(JSON.stringify(value)))
    }),
  )
})

test('what JSON cannot hold is refused as the bug it is', () => {
  for (const value of [Number.NaN, Number.POSITIVE_INFINITY, '\ud800', undefined, () => 1, 1n])
    expect(() => canonicalJson({ value: [value] })).toThrow(RangeError)
})

test('a property that is undefined counts as absent', () => {
  expect(canonicalJson({ b: undefined, a: 1 })).toBe('{"a":1}')
})
