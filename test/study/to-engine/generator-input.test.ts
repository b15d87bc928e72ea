import { describe, expect, test } from 'vitest'
import { runCase } from '@/lib/engine/run-case'
import { supplyRecord } from '@/lib/study/document/network-records'
import { scheduleRecord } from '@/lib/study/document/schedule-record'
import { readStudy } from '@/lib/study/read/read-study'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'
import { caseSentence } from '@/lib/study/words/case-sentence'
import { cautionsFor } from '@/lib/study/words/cautions'
import { levelText } from '@/lib/study/words/level-text'
import { example } from '../support/examples'

const data = {
  form: 'generator',
  rating: '25 MVA',
  synchronous: '220 %',
  transient: '25 %',
  transientTime: '4 s',
  subtransient: { reactance: '16 %', time: '30 ms' },
  quadrature: { reactance: '120 %', time: '100 ms' },
  regulator: { gain: '20', time: '50 ms', reset: '1 s', ceiling: '400 %' },
  inertia: '1.5 s',
  governor: { droop: '4 %', time: '300 ms', power: '20 MW' },
}

/** The demo's first case on a generator, or going over to it. */
const onGenerator = (level: Record<string, unknown> = {}, transfer = false) => {
  const document = example('velmoor')
  const record = document.cases[0]!
  const supply = document.plant.supplies.find(({ id }) => id === record.supply)!
  const set = supplyRecord.parse({
    ...supply,
    id: transfer ? 'set' : supply.id,
    tag: 'set',
    level: { ...data, ...level },
    xOverR: null,
    before: { kind: 'bus-voltage', voltage: supply.statedAt },
  })
  if (!transfer) document.plant.supplies = document.plant.supplies.map((one) => (one.id === supply.id ? set : one))
  else {
    document.plant.supplies = [...document.plant.supplies, set]
    document.schedules = document.schedules.map((one) =>
      one.id !== record.schedule
        ? one
        : scheduleRecord.parse({
            ...one,
            starts: [],
            disturbance: { at: '0 s', duration: '2 s', remaining: '0 %', to: { supply: 'set' }, decayTime: '1 s' },
          }),
    )
  }
  document.cases = [record]
  return { document, record, supply }
}
const inputOf = ({ document }: ReturnType<typeof onGenerator>) => studyRunInput(document).cases[0]!
const messages = ({ document }: ReturnType<typeof onGenerator>) => {
  const read = readStudy(JSON.stringify(document))
  return read.ok ? [] : read.error.issues.map(({ message }) => message)
}

describe('a generator of a study file', () => {
  test('its data in parts of the rating become ohms at its rated voltage', () => {
    const made = onGenerator()
    const { generator, impedance } = inputOf(made).supply
    const base = made.supply.statedAt.si ** 2 / 25e6
    expect(generator).toMatchObject({
      ratedPower: 25e6,
      synchronous: expect.closeTo(2.2 * base, 9),
      transient: expect.closeTo(0.25 * base, 9),
      subtransient: { reactance: expect.closeTo(0.16 * base, 9), time: 0.03 },
      regulator: { gain: 20, reset: 1, ceiling: 4, fedFromTerminals: false },
      governor: { droop: 0.04, largestPower: 20e6 },
    })
    expect(impedance.im).toBeCloseTo(0.16 * base, 9)
    expect(levelText(made.document.plant.supplies[0]!)).toMatch(/MVA/)
  })

  test('runs, with dip and frequency beside the places', () => {
    const made = onGenerator()
    const result = runCase(inputOf(made))
    expect(result.outcome).toEqual({ kind: 'complete' })
    expect(result.generator!.lowestFrequency.frequency).toBeLessThan(50)
    expect(result.generator!.first!).toBeLessThan(result.generator!.held)
    expect(cautionsFor(made.document).map(({ key }) => key)).toContain('generator')
  })

  test('the plant goes over to it, and the case says so', () => {
    const made = onGenerator({}, true)
    expect(messages(made)).toEqual([])
    expect(caseSentence(made.record, made.document)).toMatch(/^transfer to the set supply after 2 s without on the/)
    const input = inputOf(made)
    expect(input.disturbance).toMatchObject({
      remaining: 0,
      decayTime: 1,
      to: { angle: 0, generator: { ratedPower: 25e6 } },
    })
    expect(runCase(input).outcome).toEqual({ kind: 'complete' })
    expect(cautionsFor(made.document).map(({ key }) => key)).toContain('supply-transfer')
  })

  test('what cannot be is named at its field', () => {
    expect(messages(onGenerator({ transient: '300 %' }))[0]).toMatch(/X′_d of generator set cannot be above its X_d/)
    expect(messages(onGenerator({ inertia: '0 s' }))[0]).toMatch(/inertia constant H of generator set must be above 0/)
  })
})
