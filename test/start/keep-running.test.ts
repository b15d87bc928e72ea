import { type ChildProcess, spawn } from 'node:child_process'
import { expect, test } from 'vitest'
import { pause } from '@/lib/start/pause.mjs'
import { isAlive } from '@/lib/start/process-identity.mjs'
import { keepRunning, restartDelay } from '@/lib/start/service/keep-running.mjs'

const run = (lines: string): ChildProcess => spawn(process.execPath, ['-e', lines], { stdio: 'ignore' })
const waiting = 'setTimeout(() => {}, 60_000)'

async function until(condition: () => boolean): Promise<void> {
  for (let tries = 0; tries < 400 && !condition(); tries += 1) await pause(25)
  expect(condition()).toBe(true)
}

test('the pause before a restart doubles up to half a minute', () => {
  expect([1, 2, 3, 4, 5, 6, 7, 8, 20].map(restartDelay)).toEqual([0.5, 1, 2, 4, 8, 16, 30, 30, 30])
})

test('a process that is killed is started again', async () => {
  const crashes: string[] = []
  const kept = keepRunning({ launch: () => run(waiting), onCrash: (how) => void crashes.push(how) })
  const first = kept.pid() ?? 0
  process.kill(first, 'SIGKILL')
  await until(() => kept.pid() !== first)
  expect(crashes).toEqual(['signal SIGKILL'])
  expect(isAlive(kept.pid() ?? 0)).toBe(true)
  await kept.stop(1000)
})

test('a process that cannot run is tried with growing pauses', async () => {
  const delays: number[] = []
  const kept = keepRunning({ launch: () => run('process.exit(3)'), onCrash: (_, delay) => void delays.push(delay) })
  await until(() => delays.length === 2)
  expect(delays).toEqual([0.5, 1])
  expect(kept.failures()).toBe(2)
  await kept.stop(1000)
})

test('a restart on purpose is no crash', async () => {
  const crashes: string[] = []
  const kept = keepRunning({ launch: () => run(waiting), onCrash: (how) => void crashes.push(how) })
  const first = kept.pid() ?? 0
  await kept.restart()
  expect(kept.pid()).not.toBe(first)
  expect(isAlive(first)).toBe(false)
  expect(crashes).toEqual([])
  await kept.stop(1000)
})

test('a process that does not heed the request to stop is killed after its time', async () => {
  const kept = keepRunning({
    launch: () => run(`process.on('SIGTERM', () => {}); ${waiting}`),
    onCrash: () => expect.unreachable(),
  })
  await pause(700)
  const pid = kept.pid() ?? 0
  const began = performance.now()
  await kept.stop(300)
  expect(performance.now() - began).toBeGreaterThan(290)
  expect(isAlive(pid)).toBe(false)
})
