import { afterAll, beforeAll, expect, test } from 'vitest'
import { computeStudy } from '@/lib/compute/node'
import { closeThreads } from '@/lib/compute/thread-pool'
import { DomainError } from '@/lib/errors'
import { runDocument } from '@/lib/study/run-document'
import { example } from '../study/support/examples'
import { threadProgram } from './support/thread-program'

let entry: string
beforeAll(async () => {
  entry = await threadProgram('lib/compute/node.worker.ts', 'compute')
})
afterAll(() => closeThreads())

/** A few cases of the demo are enough to see progress. */
const threeCases = () => {
  const document = example('velmoor')
  document.cases = document.cases.slice(0, 3)
  return document
}

test('a study computed in a thread is the one that is computed in place, with its progress', async () => {
  const document = threeCases()
  const seen: string[] = []
  const result = await computeStudy(document, { entry, onProgress: (done, of) => seen.push(`${done}/${of}`) })
  expect(seen).toEqual(['1/3', '2/3', '3/3'])
  expect(result).toEqual(runDocument(document))
})

test('a document that does not fit together is refused with its issues, as it would be in place', async () => {
  const document = threeCases()
  document.cases[0]!.supply = 'nowhere'
  const refused = await computeStudy(document, { entry }).catch((error: unknown) => error)
  expect(refused).toBeInstanceOf(DomainError)
  expect(refused).toMatchObject({ code: 'invalid', issues: [{ path: ['cases', 0, 'supply'] }] })
})

test('a calculation can be stopped in the middle, and the next one computes', async () => {
  const stop = new AbortController()
  const running = computeStudy(example('velmoor'), {
    entry,
    signal: stop.signal,
    onProgress: () => stop.abort(),
  })
  await expect(running).rejects.toMatchObject({ code: 'wrong-state', message: 'Stopped before the end.' })
  expect((await computeStudy(example('one-motor'), { entry })).cases).toHaveLength(1)
})

test('a calculation beyond its time is ended with what to do', async () => {
  const running = computeStudy(example('velmoor'), { entry, milliseconds: 20 })
  await expect(running).rejects.toMatchObject({ code: 'too-large' })
})
