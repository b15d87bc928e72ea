import fs from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { Failure } from '@/lib/start/failure.mjs'
import { countListed, countPlaywright, countVitest } from '@/lib/start/testing/counts.mjs'
import { findChromium } from '@/lib/start/testing/find-chromium.mjs'
import { stages } from '@/lib/start/testing/stages.mjs'
import { ownFolder } from '../support/own-folder'

function report(content: unknown): string {
  const file = path.join(ownFolder(), 'report.json')
  fs.writeFileSync(file, JSON.stringify(content))
  return file
}

test('unit tests are counted from the report', () => {
  const file = report({ numPassedTests: 7, numFailedTests: 2, numPendingTests: 0 })
  expect(countVitest(file, 1)).toEqual({ passed: 7, failed: 2 })
})

test('a test file that does not load is a failure though no test failed', () => {
  const file = report({ numPassedTests: 7, numFailedTests: 0 })
  expect(countVitest(file, 1)).toMatchObject({ passed: 7, failed: 1 })
})

test('skipped tests are said and are not counted as passed', () => {
  const file = report({ numPassedTests: 7, numFailedTests: 0, numPendingTests: 3 })
  expect(countVitest(file, 0)).toEqual({ passed: 7, failed: 0, note: '3 tests were skipped' })
})

test('a tool that leaves no report has failed, whatever its exit status', () => {
  expect(countVitest('/not/there', 0).failed).toBe(1)
  expect(countPlaywright('/not/there', 0).failed).toBe(1)
})

test('browser tests are counted from the report', () => {
  const file = report({ stats: { expected: 5, unexpected: 1, flaky: 1, skipped: 0 } })
  expect(countPlaywright(file, 1)).toEqual({ passed: 6, failed: 1 })
})

test('a part that breaks off is one failure with its sentence, and the others go on', async () => {
  const said: string[] = []
  const parts = stages((line) => said.push(line))
  await parts.run('first', async () => ({ passed: 3, failed: 0 }))
  await parts.run('second', () => Promise.reject(new Failure('Do this.')))
  await parts.run('third', async () => ({ passed: 1, failed: 1 }))
  expect(parts.total()).toEqual({ passed: 4, failed: 2 })
  expect(said).toContain('Do this.')
  expect(parts.summary()).toHaveLength(3)
})

test('browser tests that cannot run are counted one by one', () => {
  expect(countListed(report({ stats: { expected: 0, unexpected: 0, flaky: 0, skipped: 12 } }))).toBe(12)
  expect(countListed('/not/there')).toBe(1)
})

const nowhere = async () => '/not/there'

test('the browser named by the variable is used, and a wrong name is said', async () => {
  expect(await findChromium({ CHROMIUM: process.execPath, PATH: '' }, nowhere)).toBe(process.execPath)
  await expect(findChromium({ CHROMIUM: '/not/there' }, nowhere)).rejects.toThrow('correct it or leave it out')
})

test('else the system browser, else the one that Playwright installed, else one sentence says how', async () => {
  const folder = ownFolder()
  expect(await findChromium({ PATH: folder }, async () => process.execPath)).toBe(process.execPath)
  await expect(findChromium({ PATH: folder }, nowhere)).rejects.toThrow('The browser tests need Chromium: install it')
  fs.writeFileSync(path.join(folder, 'chromium'), '')
  expect(await findChromium({ PATH: folder }, async () => process.execPath)).toBe(path.join(folder, 'chromium'))
})
