import fs from 'node:fs'
import path from 'node:path'
import { expect, onTestFinished, test } from 'vitest'
import { identify, isAlive } from '@/lib/start/process-identity.mjs'
import { claimRun } from '@/lib/start/service/run-record.mjs'
import { ownFolder } from '../support/own-folder'
import { ends, hears, runModule } from '../support/run-module'

const gone = { pid: 2 ** 22 + 1, began: '1' }

async function running() {
  const child = runModule(`console.log('up'); setTimeout(() => {}, 60_000)`)
  onTestFinished(() => void child.kill('SIGKILL'))
  await hears(child, 'up')
  return { child, identity: identify(child.pid ?? 0) }
}

const write = (folder: string, record: unknown): void =>
  fs.writeFileSync(path.join(folder, 'run.json'), JSON.stringify(record))

test('what a killed launcher left running is ended at the next start', async () => {
  const folder = ownFolder()
  const { child, identity } = await running()
  write(folder, { launcher: gone, address: null, children: [identity] })
  expect((await claimRun(folder)).leftovers).toBe(1)
  await ends(child)
  expect(isAlive(identity.pid)).toBe(false)
})

test('a foreign process that got the number of one of ours is left alone', async () => {
  const folder = ownFolder()
  const { identity } = await running()
  write(folder, { launcher: gone, address: null, children: [{ pid: identity.pid, began: '12345' }] })
  expect((await claimRun(folder)).leftovers).toBe(0)
  expect(isAlive(identity.pid)).toBe(true)
})

test('a process whose beginning is unknown is left alone', async () => {
  const folder = ownFolder()
  const { identity } = await running()
  write(folder, { launcher: gone, address: null, children: [{ pid: identity.pid, began: null }] })
  expect((await claimRun(folder)).leftovers).toBe(0)
  expect(isAlive(identity.pid)).toBe(true)
})

test('a second launcher on the same data folder is told where the first one serves, and ends nothing', async () => {
  const folder = ownFolder()
  const launcher = await running()
  const web = await running()
  write(folder, { launcher: launcher.identity, address: 'http://127.0.0.1:3000', children: [web.identity] })
  await expect(claimRun(folder)).rejects.toThrow('already runs on this data folder at http://127.0.0.1:3000')
  expect(isAlive(web.identity.pid)).toBe(true)
})

test('the record names the processes that run now and goes with the launcher', async () => {
  const folder = ownFolder()
  const { identity } = await running()
  const run = await claimRun(folder)
  run.update('http://127.0.0.1:3001', [identity.pid, undefined])
  expect(JSON.parse(fs.readFileSync(path.join(folder, 'run.json'), 'utf8'))).toEqual({
    launcher: identify(process.pid),
    address: 'http://127.0.0.1:3001',
    children: [identity],
  })
  run.release()
  expect(fs.existsSync(path.join(folder, 'run.json'))).toBe(false)
})
