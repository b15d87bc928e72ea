import { expect, test } from 'vitest'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { cautionsFor } from '@/lib/study/words/cautions'
import { limitSentence } from '@/lib/study/words/limit-sentence'
import { listed, listedTags } from '@/lib/study/words/list-words'
import { noticeSentence } from '@/lib/study/words/notice-words'
import { caseOutcomeSentence, startOutcomeSentence } from '@/lib/study/words/outcome-words'
import { newtonMetre, perUnit, second } from '@/lib/units/si'
import { fromRpm } from '@/lib/units/speed'
import { example } from '../support/examples'

/** Thin spaces before units as plain ones, to be read here. */
const plain = (text: string): string => text.replaceAll('\u2009', ' ')

const velmoor = example('velmoor')
const sentenceOf = (tag: string) => {
  const record = velmoor.cases.find((one) => one.tag === tag)
  if (!record) throw new Error(`no case ${tag}`)
  return caseSentence(record, velmoor)
}
const limitOf = (tag: string) => {
  const record = velmoor.limits.find((one) => one.tag === tag)
  if (!record) throw new Error(`no limit ${tag}`)
  return limitSentence(record, velmoor)
}

test('a case reads as one sentence: what starts, how, on which supply, beside what, against which load', () => {
  expect(sentenceOf('C1')).toBe(
    'M4 started direct-on-line on the weakest supply with M1–M3 and B1 running; valve closed, then open',
  )
  expect(sentenceOf('C4')).toBe(
    'M1 started by autotransformer at 65 % (transfer at 980 r/min) on the weakest supply with B1 running; valve closed, then open',
  )
  expect(sentenceOf('C7')).toMatch(/; valve open$/)
  expect(sentenceOf('C16')).toMatch(/^M1–M4 started together by autotransformer at 65 %/)
  expect(sentenceOf('C18')).toBe(
    'B1 started by star-delta (delta at 1440 r/min) on the weakest supply with M1–M3 running; throttled, then running',
  )
})

test('a sensitivity says what departs from the records', () => {
  expect(sentenceOf('C21')).toMatch(
    /; torque of M4 × 0\.85, inertia of M4 × 1\.10, impedance of T1 8\.8 % and 31\.4 kV before the start$/,
  )
})

test('a limit reads as one sentence with its place, its value and the reference of its value', () => {
  expect(limitOf('R1')).toBe(
    'PCC: deepest change, at most 4.0 % of the voltage before the start; for more than 4 starts a day and at most 2 an hour',
  )
  expect(limitOf('R4')).toBe(
    'PCC: settled change after the process loads, at most 3.0 % of the voltage before the start',
  )
  expect(limitOf('R6')).toBe('MV: remaining voltage, at least 0.80 of nominal')
  expect(limitOf('R9')).toBe('starting motors: remaining voltage, at least 0.80 of rated voltage; direct-on-line only')
  expect(limitOf('R10')).toBe(
    'starting motors: least accelerating torque up to 95 % of rated speed, at least 10 % of rated torque',
  )
  expect(limitOf('R11')).toBe(
    'starting motors: run-up to 98 % of rated speed with the starting device in its running position, at most 20 s',
  )
  expect(limitOf('R12')).toBe('starting motors: heat used from hot, at most 60 % of the permissible locked-rotor heat')
  expect(limitOf('R13')).toBe('every bus: highest voltage, at most 1.10 of nominal')
})

test('tags that follow one another draw together, two do not', () => {
  expect(listedTags(['M1', 'M2', 'M3', 'B1'])).toBe('M1–M3 and B1')
  expect(listedTags(['M1', 'M2'])).toBe('M1 and M2')
  expect(listedTags(['M1', 'M3', 'M4', 'M5'])).toBe('M1 and M3–M5')
  expect(listed(['a', 'b', 'c'])).toBe('a, b and c')
})

test('every way a start can end is said in one sentence', () => {
  expect(plain(startOutcomeSentence({ kind: 'started', at: second(10.378) }, 'M4'))).toBe(
    'M4 is at speed and in its running connection after 10.38 s.',
  )
  expect(plain(startOutcomeSentence({ kind: 'not-transferred', speed: fromRpm(974.2) }, 'M4'))).toMatch(
    /^M4 hangs at 974 r\/min/,
  )
  expect(plain(startOutcomeSentence({ kind: 'never-turned', missing: newtonMetre(812.4) }, 'M4'))).toBe(
    'M4 does not turn; 812 N·m are missing to break away.',
  )
})

test('a refused case names its buses by their tags', () => {
  expect(
    caseOutcomeSentence({ kind: 'refused', cause: 'island', buses: ['pcc', 'mv'], detail: '' }, (id) =>
      id.toUpperCase(),
    ),
  ).toBe('The case cannot be set up: some buses have no way to the supply (PCC and MV).')
  expect(plain(caseOutcomeSentence({ kind: 'collapsed', at: second(1.5), busId: 'mv' }, () => 'MV'))).toMatch(
    /collapses at MV 1\.50 s after/,
  )
})

test('a start at reduced voltage says that torque as voltage squared is optimistic', () => {
  expect(
    plain(noticeSentence({ kind: 'reduced-voltage-torque', motorId: 'm4', voltage: perUnit(0.585) }, velmoor)),
  ).toMatch(/^M4 starts at 58\.5 % of its rated voltage/)
})

test('cautions are the general ones and those that the records touch', () => {
  const cautions = cautionsFor(velmoor)
  expect(cautions.map(({ key, about }) => `${key} ${about}`.trim())).toEqual([
    'judgement',
    'model',
    'protection',
    'recommendation',
    'starts',
    'energisation T1',
    'residual-voltage Star-delta',
    'stored-energy K1 and P1–P4',
    'capacitor K1',
    'process-surge P1–P4 and PB1',
    'repeated-starts M1–M4 and B1',
  ])
  expect(cautionsFor(example('one-motor')).map(({ key }) => key)).toContain('estimated-circuit')
  expect(cautionsFor(example('one-motor')).map(({ key }) => key)).not.toContain('process-surge')
})
