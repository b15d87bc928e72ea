import { describe, expect, it, test } from 'vitest'
import type { Verdict, VerdictWord } from '@/lib/engine/criteria/rule'
import type { LimitRecord } from '@/lib/study/document/limit-record'
import { runDocument } from '@/lib/study/run-document'
import { startsAllowedIn, startsByClass } from '@/lib/study/starts-allowed'
import { summarise } from '@/lib/study/summary'
import { startsAllowedPhrase } from '@/lib/study/words/protection-words'
import { example } from './support/examples'

const verdict = (ruleId: string, word: VerdictWord): Verdict => ({
  ruleId,
  caseId: 'c',
  word,
  reason: null,
  inUse: true,
  value: null,
  limit: 1,
  margin: null,
  busId: null,
  motorId: null,
  at: null,
})

/** Limits of 6 % up to one start an hour, 4 % up to four, 3 % up to ten. */
const classes: LimitRecord[] = (
  [
    ['rare', null, 1],
    ['some', 1, 4],
    ['many', 4, 10],
  ] as const
).map(([id, moreThanPerHour, atMostPerHour]) => ({
  ...example('velmoor').limits[0]!,
  id,
  startClass: { moreThanPerDay: null, atMostPerDay: null, moreThanPerHour, atMostPerHour },
}))

describe('starts an hour by the classes of the limits', () => {
  it('are the most at which a class holds', () => {
    const held = (...words: VerdictWord[]) =>
      startsByClass(
        classes,
        classes.map(({ id }, i) => verdict(id, words[i]!)),
        1,
      )
    expect(held('meets', 'meets', 'fails')).toBe(4)
    expect(held('meets', 'close', 'close')).toBe(10)
    expect(held('meets', 'not-assessed', 'fails')).toBe(1)
    expect(held('fails', 'fails', 'fails')).toBe(0)
  })

  it('are left open where no limit names a number an hour', () =>
    expect(startsByClass([{ ...classes[0]!, startClass: null }], [verdict('rare', 'fails')], 1)).toBeUndefined())
})

test('the demo allows the two starts an hour of maker and utility with the autotransformer, none direct-on-line', () => {
  const document = example('velmoor')
  document.cases = document.cases.slice(0, 2)
  const summary = summarise(runDocument(document))
  const [direct, reduced] = summary.cases.map((one) => startsAllowedIn(document, summary, one)[0]!.allowed)
  expect(direct).toMatchObject({ perHour: 0, governing: ['utility'] })
  expect(reduced).toMatchObject({ perHour: 2, governing: ['maker', 'utility'] })
  expect(startsAllowedPhrase(reduced!)).toContain('2, by the maker of the motor and class of starts of the limits')
})

test('a process lowers the number, and is named', () => {
  const document = example('velmoor')
  document.cases = document.cases.slice(1, 2)
  for (const load of document.plant.drivenLoads) load.startsPerHour = 1
  const summary = summarise(runDocument(document))
  expect(startsAllowedIn(document, summary, summary.cases[0]!)[0]!.allowed).toMatchObject({
    perHour: 1,
    governing: ['process'],
  })
})
