import { describe, expect, test } from 'vitest'
import { changeSentence } from '@/lib/study/diff/change-sentence'
import { diffInputs } from '@/lib/study/diff/diff-inputs'
import { diffResults } from '@/lib/study/diff/diff-results'
import { diffVerdicts } from '@/lib/study/diff/diff-verdicts'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { runDocument } from '@/lib/study/run-document'
import { summarise } from '@/lib/study/summary'
import { example } from '../support/examples'

const first = example('one-motor')
const summaryOf = (document: StudyDocument) => summarise(runDocument(document))
const side = (document: StudyDocument) => ({ document, summary: summaryOf(document) })

/** The first motor with other values. */
const withMotor = (change: object): StudyDocument => ({
  ...first,
  plant: { ...first.plant, motors: first.plant.motors.map((motor, i) => (i === 0 ? { ...motor, ...change } : motor)) },
})
const motor = first.plant.motors[0]!
const heavier = withMotor({ inertia: { ...motor.inertia, text: '400 kg·m²', si: 400 } })

describe('a document against itself', () => {
  test('has no change in inputs, verdicts or figures', () => {
    expect(diffInputs(first, first)).toEqual([])
    const one = side(first)
    expect(diffVerdicts(one, one)).toEqual([])
    expect(diffResults(one, one)).toEqual([])
  })

  test('has none either when its records stand in another order', () => {
    const { plant } = first
    const turned = { ...first, plant: { ...plant, buses: plant.buses.toReversed(), motors: plant.motors.toReversed() } }
    expect(diffInputs(first, turned)).toEqual([])
  })
})

describe('what changed between two documents', () => {
  test('is named by record and field, with both texts', () => {
    expect(diffInputs(first, heavier)).toEqual([
      {
        anchor: `motors/${motor.id}/inertia`,
        record: `Motor ${motor.tag}`,
        field: 'inertia',
        before: motor.inertia.text,
        after: '400 kg·m²',
      },
    ])
  })

  test('is another tag or another source too', () => {
    const renamed = diffInputs(first, withMotor({ tag: 'M-9' }))
    expect(renamed).toMatchObject([{ field: 'tag', before: motor.tag, after: 'M-9' }])
    const provenance = { kind: 'test' as const, source: 'Test report 12' }
    const sourced = diffInputs(first, withMotor({ inertia: { ...motor.inertia, provenance } }))
    expect(sourced).toMatchObject([{ field: 'source of inertia', after: 'test: Test report 12' }])
  })

  test('is one line for a record that is new or gone', () => {
    const capacitor = { ...first.plant.buses[0]!, id: 'new-bus', tag: 'NEW' }
    const more = { ...first, plant: { ...first.plant, buses: [...first.plant.buses, capacitor] } }
    expect(diffInputs(first, more)).toEqual([
      { anchor: 'buses/new-bus', record: 'Bus NEW', field: 'the record', before: null, after: 'added' },
    ])
    expect(diffInputs(more, first)).toMatchObject([{ before: 'removed', after: null }])
  })

  test('is undone by the way back', () => {
    const there = diffInputs(first, heavier)
    const back = diffInputs(heavier, first)
    expect(back).toEqual(there.map((change) => ({ ...change, before: change.after, after: change.before })))
  })
})

describe('more inertia', () => {
  const [light, slow] = [side(first), side(heavier)]

  test('makes the run-up longer and leaves the voltage before the start alone', () => {
    const changes = diffResults(light, slow)
    const runUp = changes.find(({ what }) => what.startsWith('run-up of'))
    expect(Number.parseFloat(runUp!.after!)).toBeGreaterThan(Number.parseFloat(runUp!.before!))
    expect(changes.filter(({ what }) => what.startsWith('voltage before'))).toEqual([])
  })

  test('flips what it flips: the words say from which verdict to which', () => {
    const verdicts = diffVerdicts(light, slow)
    const flipped = verdicts.filter((one) => one.flipped)
    expect(verdicts.slice(0, flipped.length)).toEqual(flipped)
    const sentence = changeSentence(diffInputs(first, heavier), verdicts)
    expect(sentence).toMatch(/^Changed: Motor .*, inertia: .* to 400 kg·m²\. /)
    expect(sentence.includes('Verdicts changed')).toBe(flipped.length > 0)
  })
})

test('a revision without a change says so', () => {
  expect(changeSentence([], [])).toBe('No input of the calculation changed. No verdict changed.')
})
