import fs from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { chooseAccount, placeCluster } from '@/lib/start/embedded/account.mjs'
import { ownFolder } from '../support/own-folder'

const asRoot = process.getuid?.() === 0

/** A folder that looks like an existing cluster. */
function clusterFolder(): string {
  const folder = ownFolder()
  fs.writeFileSync(path.join(folder, 'PG_VERSION'), '18\n')
  return folder
}

test('under root the server runs as an unprivileged account', () => {
  const { uid, gid } = chooseAccount(path.join(ownFolder(), 'pg'), 0)
  expect(uid).toBeGreaterThan(0)
  expect(gid).toBeGreaterThan(0)
})

test('an ordinary account runs the server itself', () => {
  expect(chooseAccount(path.join(ownFolder(), 'pg'), 1000)).toEqual({})
})

test('a database of another account is refused with what to do', () => {
  const folder = clusterFolder()
  const { uid } = fs.statSync(folder)
  expect(() => chooseAccount(folder, uid + 1)).toThrow(`belongs to another account (uid ${uid})`)
})

test.runIf(asRoot)('under root an existing database keeps the account it was made with', () => {
  const folder = clusterFolder()
  fs.chownSync(folder, 4321, 4322)
  expect(chooseAccount(folder, 0)).toEqual({ uid: 4321, gid: 4322 })
})

test.runIf(asRoot)(
  'under root a folder closed to the server account is replaced by one it can enter, always the same',
  () => {
    const closed = path.join(ownFolder(), 'closed')
    fs.mkdirSync(closed, { mode: 0o700 })
    const first = placeCluster(path.join(closed, 'pg'))
    expect(first.dataDir).toMatch(/^\/var\/tmp\/breakaway-data-[0-9a-f]{12}\/pg$/)
    expect(placeCluster(path.join(closed, 'pg'))).toEqual(first)
    fs.rmSync(path.dirname(first.dataDir), { recursive: true })
  },
)

test('a folder the server account can enter is used as it is', () => {
  const dataDir = path.join(ownFolder(), 'pg')
  expect(placeCluster(dataDir).dataDir).toBe(dataDir)
})
