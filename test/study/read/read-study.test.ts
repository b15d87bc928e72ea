import { expect, test } from 'vitest'
import { readStudy } from '@/lib/study/read/read-study'
import { example, exampleText } from '../support/examples'

type Json = Record<string, unknown>

/** The small example with one change made to its parsed text. */
const changed = (change: (file: Json) => void): string => {
  const file = JSON.parse(exampleText('one-motor')) as Json
  change(file)
  return JSON.stringify(file)
}
const plant = (file: Json, list: string) => (file.plant as Record<string, Json[]>)[list]![0]!

const issuesOf = (text: string) => {
  const read = readStudy(text)
  return read.ok ? [] : read.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`)
}

test('a file written by hand in short form becomes a complete document', () => {
  const document = example('one-motor')
  expect(document.plant.buses[0]?.nominal).toEqual({
    text: '11 kV',
    si: 11_000,
    quantity: 'voltage',
    style: 'point',
    provenance: null,
  })
  expect(document.plant.motors[0]?.permissibleHot).toBeNull()
  expect(document.plant.capacitors).toEqual([])
})

test('a complete document reads back as itself', () => {
  const document = example('velmoor')
  expect(readStudy(JSON.stringify(document))).toEqual({ ok: true, value: document })
})

test('text that is not JSON is refused with the line', () => {
  const broken = '{\n  "format": "breakaway-study",\n  oops\n}'
  expect(issuesOf(broken)).toEqual([': This file is not written as JSON near line 3, column 3; correct it there.'])
})

test.each([
  ['another kind of file', '[]', ': This is not a study file: it does not hold a record in braces.'],
  [
    'a file of something else',
    '{"format":"x"}',
    'format: This is not a study file: its “format” does not say “breakaway-study”.',
  ],
  [
    'no version',
    '{"format":"breakaway-study"}',
    'formatVersion: Give the version of the format, a whole number; it is 1 now.',
  ],
  [
    'a version of the future',
    '{"format":"breakaway-study","formatVersion":7}',
    'formatVersion: This file is of version 7 of the format and this program reads up to 1; use a newer program.',
  ],
])('%s is refused in one sentence', (_, text, sentence) => {
  expect(issuesOf(text)).toEqual([sentence])
})

test.each<[string, (file: Json) => void, string]>([
  [
    'a value with the unit of something else',
    (file) => Object.assign(plant(file, 'buses'), { nominal: '11 kW' }),
    'plant.buses.0.nominal: kW is not a unit of voltage; write for example 11 kV.',
  ],
  [
    'a value without its unit',
    (file) => Object.assign(plant(file, 'buses'), { nominal: '11' }),
    'plant.buses.0.nominal: Add a unit, for example 11 kV.',
  ],
  [
    'a bare number where a value belongs',
    (file) => Object.assign(plant(file, 'buses'), { nominal: 11 }),
    'plant.buses.0.nominal: Write this value with its unit in quotation marks, for example "11 kV".',
  ],
  [
    'a missing value',
    (file) => Reflect.deleteProperty(plant(file, 'buses'), 'nominal'),
    'plant.buses.0.nominal: This value is missing; give it with its unit in quotation marks, for example "11 kV".',
  ],
  [
    'a text that is missing',
    (file) => Reflect.deleteProperty(plant(file, 'buses'), 'tag'),
    'plant.buses.0.tag: This is missing; give a text in quotation marks.',
  ],
  [
    'a name that is not known',
    (file) => Object.assign(plant(file, 'motors'), { colour: 'grey' }),
    'plant.motors.0: “colour” is not known here; remove it or correct its name.',
  ],
  [
    'a kind that does not exist',
    (file) => Object.assign(plant(file, 'motors'), { circuit: { kind: 'guess' } }),
    'plant.motors.0.circuit.kind: Give “single-cage”, “double-cage”, “deep-bar”, “slot-bar”, “table” or “estimated” here.',
  ],
  [
    'an odd number of poles',
    (file) => Object.assign(plant(file, 'motors'), { poles: 5 }),
    'plant.motors.0.poles: The number of poles is even.',
  ],
  [
    'a number that is too large',
    (file) => Object.assign(plant(file, 'lines'), { parallel: 40 }),
    'plant.lines.0.parallel: This cannot be above 20.',
  ],
  [
    'a source without its kind',
    (file) => Object.assign(plant(file, 'buses'), { nominal: { text: '11 kV', provenance: { source: 'x' } } }),
    'plant.buses.0.nominal.provenance.kind: This is missing; give “test”, “guaranteed”, “typical”, “derived” or “assumed”.',
  ],
  [
    'a date in another form',
    (file) => Object.assign(plant(file, 'supplies'), { date: '12 May 2026' }),
    'plant.supplies.0.date: Write the date as year-month-day, for example 2026-05-12.',
  ],
  [
    'a negative voltage',
    (file) => Object.assign(plant(file, 'buses'), { nominal: '-11 kV' }),
    'plant.buses.0.nominal: A voltage must be above zero.',
  ],
])('%s is refused in plain words at its field', (_, change, sentence) => {
  expect(issuesOf(changed(change))).toEqual([sentence])
})

test('a value that its text no longer says is refused: what prints must be what was computed', () => {
  const text = changed((file) => Object.assign(plant(file, 'buses'), { nominal: { text: '11 kV', si: 11 } }))
  expect(issuesOf(text)).toEqual([
    'plant.buses.0.nominal: The text “11 kV” reads as 11000 in SI units, and the record holds 11; enter the value again.',
  ])
})

test('a number style goes with its value', () => {
  const text = changed((file) => Object.assign(plant(file, 'buses'), { nominal: { text: '11.000 V', style: 'comma' } }))
  const read = readStudy(text)
  expect(read.ok && read.value.plant.buses[0]?.nominal.si).toBe(11_000)
})

test('of very many issues the first fifty are listed and all are counted', () => {
  const text = changed((file) => {
    const bus = plant(file, 'buses')
    ;(file.plant as Json).buses = Array.from({ length: 80 }, () => ({ ...bus, tag: '' }))
  })
  const read = readStudy(text)
  if (read.ok) expect.unreachable()
  expect(read.error.issues).toHaveLength(50)
  expect(read.error.message).toBe('80 things are wrong in this study; the first 50 are listed.')
})

test('a file that is far too large is refused before it is parsed', () => {
  const read = readStudy(' '.repeat(20_000_001))
  expect(!read.ok && read.error.code).toBe('too-large')
})

test('whatever JSON a file holds, the answer is a document or a refusal, never a crash', () => {
  for (const text of [
    'null',
    '0',
    '""',
    '{}',
    '{"format":"breakaway-study","formatVersion":1}',
    '{"format":"breakaway-study","formatVersion":1,"plant":[],"cases":{}}',
  ])
    expect(readStudy(text).ok).toBe(false)
})
