// @ts-check
import { spawnSync } from 'node:child_process'
import crypto from 'node:crypto'
import fs from 'node:fs'
import os from 'node:os'
import path from 'node:path'
import { Failure } from '../failure.mjs'
import { programIn } from './binaries.mjs'

/** @typedef {import('./binaries.mjs').Account} Account */
/** @typedef {{ administrator: string, owner: string }} Passwords of the superuser and of the application's role */

/** The superuser of an embedded cluster; the application never signs in as it. */
export const administratorRole = 'breakaway_admin'

const randomPassword = () => crypto.randomBytes(24).toString('base64url')

/** @param {string} dataDir @returns {string} beside the cluster, since it opens this cluster and nothing else */
const passwordFile = (dataDir) => `${dataDir}.passwords`

/**
 * @param {string} dataDir
 * @returns {Passwords}
 */
export function readPasswords(dataDir) {
  try {
    return JSON.parse(fs.readFileSync(passwordFile(dataDir), 'utf8'))
  } catch (error) {
    throw new Failure(
      `The passwords of the embedded database are missing (${passwordFile(dataDir)}): restore that file from a backup, or set DATA_DIR to another folder.`,
      error,
    )
  }
}

/** @param {string} dataDir @returns {boolean} */
export const clusterExists = (dataDir) => fs.existsSync(path.join(dataDir, 'PG_VERSION'))

/**
 * Half clusters of a killed first start; they never had the real name.
 * @param {string} dataDir
 */
function removeUnfinished(dataDir) {
  const prefix = `${path.basename(dataDir)}.unfinished-`
  for (const name of fs.readdirSync(path.dirname(dataDir))) {
    if (name.startsWith(prefix)) fs.rmSync(path.join(path.dirname(dataDir), name), { recursive: true, force: true })
  }
}

/**
 * Makes an empty cluster under a temporary name and renames it: a killed first start leaves nothing under the real name.
 * Locale and collation are the server's own (no library of the system), checksums of pages are on.
 * @param {{ dataDir: string, account: Account, native: string }} where
 */
export function createCluster({ dataDir, account, native }) {
  removeUnfinished(dataDir)
  const unfinished = `${dataDir}.unfinished-${process.pid}`
  fs.mkdirSync(unfinished, { mode: 0o700 })
  const passwords = { administrator: randomPassword(), owner: randomPassword() }
  const oneLine = path.join(os.tmpdir(), `breakaway-${crypto.randomUUID()}`)
  fs.writeFileSync(oneLine, `${passwords.administrator}\n`, { mode: 0o600 })
  if (account.uid !== undefined && account.gid !== undefined) {
    fs.chownSync(unfinished, account.uid, account.gid)
    fs.chownSync(oneLine, account.uid, account.gid)
  }
  // what tells about an earlier cluster of this name goes with it
  for (const word of ['passwords', 'port', 'seeded']) fs.rmSync(`${dataDir}.${word}`, { force: true })
  fs.writeFileSync(passwordFile(dataDir), JSON.stringify(passwords), { mode: 0o600 })
  try {
    const options = [
      '-D',
      unfinished,
      '-U',
      administratorRole,
      `--pwfile=${oneLine}`,
      '--auth=scram-sha-256',
      '-E',
      'UTF8',
    ]
    const locale = ['--locale-provider=builtin', '--builtin-locale=C.UTF-8', '--locale=C']
    const made = spawnSync(programIn(native, 'initdb'), [...options, ...locale], {
      ...account,
      encoding: 'utf8',
      cwd: unfinished,
      env: { ...process.env, TZ: 'UTC' },
    })
    if (made.status !== 0) {
      const reason = (made.stderr ?? '').trim().split('\n').at(-1) || String(made.error)
      // containers may run programs under a number that the system has no name for
      const remedy = reason.includes('user does not exist')
        ? 'run Breakaway under an account that the system knows by name'
        : 'check disk space and rights'
      throw new Failure(
        `The embedded database could not be created in ${dataDir} (${reason}): ${remedy}, or set DATABASE_URL.`,
      )
    }
    fs.renameSync(unfinished, dataDir)
  } finally {
    fs.rmSync(oneLine, { force: true })
  }
}
