import { expect, test } from 'vitest'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { preIssueChecks } from '@/lib/study/pre-issue-checks'
import { example } from './support/examples'

const failing = (document: StudyDocument) =>
  preIssueChecks(document)
    .filter(({ passed }) => !passed)
    .map(({ id }) => id)

test('the demo study leaves four questions open: pull-up points, editions, the duty of star-delta, the relay of the booster', () => {
  expect(failing(example('velmoor'))).toEqual(['pull-up', 'editions', 'duty', 'relay'])
})

test.each<[string, (document: StudyDocument) => unknown]>([
  ['sources', ({ plant }) => Object.assign(plant.buses[0]!.nominal, { provenance: null })],
  ['level-date', ({ plant }) => Object.assign(plant.supplies[0]!, { date: null })],
  [
    'weakest',
    (document) => Object.assign(document, { cases: document.cases.filter(({ supply }) => supply !== 'weakest') }),
  ],
  ['voltage-factor', ({ plant }) => Object.assign(plant.supplies[1]!, { voltageFactor: { kind: 'unknown' } })],
  [
    'power-factor',
    ({ plant }) => Object.assign(plant.motors[0]!, { circuit: { kind: 'estimated' }, lockedRotorPowerFactor: null }),
  ],
  ['plate', ({ plant }) => Object.assign(plant.motors[0]!, { codeLetter: 'A' })],
  ['running', ({ plant }) => plant.plantConditions.map((condition) => Object.assign(condition, { running: [] }))],
  ['clauses', ({ limits }) => Object.assign(limits[0]!, { clause: '' })],
  ['tolerance', (document) => document.cases.map((one) => Object.assign(one, { changes: [] }))],
  [
    'bypass',
    (document) =>
      Object.assign(document, { cases: document.cases.filter(({ schedule }) => !schedule.endsWith('direct')) }),
  ],
  [
    'process',
    ({ plant }) =>
      plant.loadConditions.flatMap(({ curves }) => curves.map((curve) => Object.assign(curve, { process: null }))),
  ],
])('the question “%s” is answered by naming what is missing', (id, spoil) => {
  const document = example('velmoor')
  spoil(document)
  const check = preIssueChecks(document).find((one) => one.id === id)
  expect(check?.passed).toBe(false)
  expect(check?.issues[0]?.message).toMatch(/\.$/)
})

test('a motor that starts without a relay beside it is named', () => {
  const document = example('velmoor')
  document.plant.motors[3]!.protection = null
  expect(failing(document)).toContain('relay')
})
