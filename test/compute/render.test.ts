import fs from 'node:fs'
import path from 'node:path'
import { afterAll, expect, test } from 'vitest'
import { renderReport } from '@/lib/compute/render'
import { closeThreads, runInThread } from '@/lib/compute/thread-pool'
import type { ReportInput } from '@/lib/report/report-input'

const folder = path.resolve(import.meta.dirname, '../../.data/test/threads')

/** A thread's program that stands in for the rendering one, to meet the limits without waiting for a report. */
const program = (name: string, body: string): string => {
  fs.mkdirSync(folder, { recursive: true })
  const file = path.join(folder, `${name}.mjs`)
  fs.writeFileSync(file, `export async function render(input) { ${body} }\n`)
  return file
}
const input = { draft: true } as ReportInput

afterAll(() => closeThreads())

test('the bytes of a finished report come back whole', async () => {
  const entry = program('done', 'return { pdf: new Uint8Array([37, 80, 68, 70, input.draft ? 1 : 0]), pages: 1 }')
  expect(await renderReport(input, { entry })).toEqual({ pdf: new Uint8Array([37, 80, 68, 70, 1]), pages: 1 })
})

test('a report that never ends is ended at its time with a sentence', async () => {
  const entry = program('endless', 'for (;;) {}')
  await expect(renderReport(input, { entry, milliseconds: 500 })).rejects.toMatchObject({
    code: 'too-large',
    message: 'The work took longer than it may: divide the study into fewer cases, then try again.',
  })
})

test('work that takes all memory ends its thread, not the process', async () => {
  const entry = program('greedy', 'const kept = []; for (;;) kept.push(new Array(1e6).fill(kept.length))')
  const work = runInThread(input, { entry, name: 'render', milliseconds: 30_000, heapMegabytes: 50 })
  await expect(work).rejects.toMatchObject({ code: 'too-large' })
})

test('a bug in the thread is thrown on with its words', async () => {
  await expect(renderReport(input, { entry: program('broken', `throw new Error('page 3')`) })).rejects.toThrow('page 3')
})

test('a report can be stopped', async () => {
  const stop = new AbortController()
  const running = renderReport(input, { entry: program('stopped', 'for (;;) {}'), signal: stop.signal })
  setTimeout(() => stop.abort(), 100)
  await expect(running).rejects.toMatchObject({ code: 'wrong-state' })
})
