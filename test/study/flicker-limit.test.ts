import { expect, test } from 'vitest'
import { studyDocument } from '@/lib/study/document/study-document'
import { runDocument } from '@/lib/study/run-document'
import { limitSentence } from '@/lib/study/words/limit-sentence'
import { example } from './support/examples'

const withLimit = (value: string) => {
  const document = example('one-motor')
  const bus = document.plant.buses[0]!.id
  const limit = {
    id: 'pst',
    tag: 'F1',
    place: { kind: 'bus' as const, bus },
    quantity: 'flicker-short-term' as const,
    reference: 'nominal' as const,
    limit: { kind: 'ratio' as const, value },
    appliesTo: {},
    verify: true,
  }
  return studyDocument.parse({ ...document, limits: [limit] })
}

test('a limit on short-term flicker is held against the flickermeter at its place, over all circuits on the plate', () => {
  const [strict, loose] = [runDocument(withLimit('0.01')), runDocument(withLimit('5'))]
  const [own, ...others] = [strict.cases[0]!, ...strict.cases[0]!.variants!.map(({ result }) => result)]
  const flicker = own!.flicker![0]!
  const severities = [flicker, ...others.map((one) => one.flicker![0]!)].map(({ shortTerm }) => shortTerm.meter)
  const value = Math.max(...severities)
  expect(value).toBeGreaterThan(flicker.shortTerm.meter)
  expect(strict.verdicts[0]).toMatchObject({ word: 'fails', value, busId: flicker.busId, circuits: severities.length })
  expect(loose.verdicts[0]!.word).toBe('meets')
  expect(loose.cases[0]!.flicker).toEqual(strict.cases[0]!.flicker)
})

test('no flicker is computed where no limit asks for it', () =>
  expect(runDocument(example('one-motor')).cases[0]!.flicker).toBeUndefined())

test('the limit reads as a severity without a unit', () =>
  expect(limitSentence(withLimit('0.9').limits[0]!, withLimit('0.9'))).toContain(
    'short-term flicker Pst by flickermeter, at most 0.9',
  ))
