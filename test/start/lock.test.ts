import fs from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { withLock } from '@/lib/start/lock.mjs'
import { pause } from '@/lib/start/pause.mjs'
import { ownFolder } from '../support/own-folder'
import { ends, hears, runModule } from '../support/run-module'

const holder = (file: string) => `
  import { withLock } from './lib/start/lock.mjs'
  await withLock(${JSON.stringify(file)}, async () => { console.log('holds'); await new Promise((r) => setTimeout(r, 60_000)) })`

test('a second process waits, is told for whom, and works once the first is done', async () => {
  const file = path.join(ownFolder(), 'lock')
  const order: string[] = []
  let release = () => {}
  const first = withLock(
    file,
    () =>
      new Promise<void>((resolve) => {
        release = resolve
      }),
  )
  const second = withLock(
    file,
    async () => order.push('second'),
    (pid) => order.push(pid === process.pid ? 'told' : 'wrong'),
  )
  await pause(200)
  expect(order).toEqual(['told'])
  release()
  await Promise.all([first, second])
  expect(order).toEqual(['told', 'second'])
  expect(fs.existsSync(file)).toBe(false)
})

test('the lock of a killed process is taken over', async () => {
  const file = path.join(ownFolder(), 'lock')
  const child = runModule(holder(file))
  await hears(child, 'holds')
  child.kill('SIGKILL')
  await ends(child)
  expect(fs.existsSync(file)).toBe(true)
  expect(await withLock(file, async () => 'done')).toBe('done')
})

test('the lock of a living process is not taken over', async () => {
  const file = path.join(ownFolder(), 'lock')
  const child = runModule(holder(file))
  await hears(child, 'holds')
  const mine = withLock(file, async () => 'mine')
  expect(await Promise.race([mine, pause(500).then(() => 'waiting')])).toBe('waiting')
  child.kill('SIGKILL')
  expect(await mine).toBe('mine')
})

test('six processes at once after a kill never work at the same time', async () => {
  const folder = ownFolder()
  const file = path.join(folder, 'lock')
  fs.writeFileSync(file, JSON.stringify({ pid: 2 ** 22 + 1, began: '1' }))
  const inside = path.join(folder, 'inside')
  const children = Array.from({ length: 6 }, () =>
    runModule(`
      import fs from 'node:fs'
      import { withLock } from './lib/start/lock.mjs'
      import { pause } from './lib/start/pause.mjs'
      for (let i = 0; i < 5; i += 1) await withLock(${JSON.stringify(file)}, async () => {
        fs.mkdirSync(${JSON.stringify(inside)})
        await pause(10)
        fs.rmdirSync(${JSON.stringify(inside)})
      })`),
  )
  // a second one inside would find the folder there and end with a failure
  expect(await Promise.all(children.map(ends))).toEqual([0, 0, 0, 0, 0, 0])
})

test('the lock is given back when the work fails', async () => {
  const file = path.join(ownFolder(), 'lock')
  await expect(withLock(file, () => Promise.reject(new Error('broken')))).rejects.toThrow('broken')
  expect(fs.existsSync(file)).toBe(false)
})
