import { expect, test } from 'vitest'
import { identify, isAlive, stillRuns } from '@/lib/start/process-identity.mjs'
import { ends, hears, runModule } from '../support/run-module'

test('a running process is recognised and an ended one is not', async () => {
  const child = runModule(`console.log('up'); setTimeout(() => {}, 60_000)`)
  await hears(child, 'up')
  const identity = identify(child.pid ?? 0)
  expect(stillRuns(identity)).toBe(true)
  child.kill('SIGKILL')
  await ends(child)
  expect(stillRuns(identity)).toBe(false)
  expect(isAlive(identity.pid)).toBe(false)
})

test('another process that got the same number is not taken for the recorded one', () => {
  const { pid, began } = identify(process.pid)
  expect(began).not.toBeNull()
  expect(stillRuns({ pid, began: `${began}0` })).toBe(false)
})
