import { Worker as NodeWorker } from 'node:worker_threads'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { computeStudyInBrowser } from '@/lib/compute/browser'
import { runDocument } from '@/lib/study/run-document'
import { example } from '../study/support/examples'
import { threadProgram } from './support/thread-program'

/** What a browser gives a module in a worker, put on Node's threads. */
const banner = `
import { parentPort } from 'node:worker_threads'
globalThis.self = {
  postMessage: (message) => parentPort.postMessage(message),
  addEventListener: (type, listener) => parentPort.on(type, (data) => listener({ data })),
}`

let program = ''
const asked: string[] = []

class PageWorker {
  readonly #worker = new NodeWorker(program)

  constructor(url: URL, options: { type: string }) {
    asked.push(`${url.pathname.split('/').at(-1)} ${options.type}`)
  }
  addEventListener(type: 'message' | 'error', listener: (event: unknown) => void) {
    this.#worker.on(type, (data) => listener(type === 'message' ? { data } : data))
  }
  postMessage(message: unknown) {
    this.#worker.postMessage(message)
  }
  terminate() {
    void this.#worker.terminate()
  }
}

beforeAll(async () => {
  program = await threadProgram('lib/compute/browser.worker.ts', 'browser', banner)
  Object.assign(globalThis, { Worker: PageWorker })
})
afterAll(() => {
  Reflect.deleteProperty(globalThis, 'Worker')
})

test('a study computed in the page is the one that is computed elsewhere', async () => {
  const document = example('one-motor')
  const seen: string[] = []
  const result = await computeStudyInBrowser(document, { onProgress: (done, of) => seen.push(`${done}/${of}`) })
  expect(result).toEqual(runDocument(document))
  expect(seen).toEqual(['1/1'])
  expect(asked).toEqual(['browser.worker.ts module'])
})

test('a refusal crosses the thread with its code and issues', async () => {
  const document = example('one-motor')
  document.plant.supplies[0]!.xOverR = null
  await expect(computeStudyInBrowser(document)).rejects.toMatchObject({
    name: 'DomainError',
    code: 'invalid',
    issues: [{ path: ['plant', 'supplies', 0, 'xOverR'] }],
  })
})

test('leaving the page stops the thread', async () => {
  const stop = new AbortController()
  const running = computeStudyInBrowser(example('velmoor'), {
    signal: stop.signal,
    onProgress: () => stop.abort(new Error('left')),
  })
  await expect(running).rejects.toThrow('left')
  await expect(computeStudyInBrowser(example('velmoor'), { signal: stop.signal })).rejects.toThrow('left')
})
