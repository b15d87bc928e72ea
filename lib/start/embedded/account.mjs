// @ts-check
import { spawnSync } from 'node:child_process'
import crypto from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { Failure } from '../failure.mjs'

/** @typedef {import('./binaries.mjs').Account} Account */

/** @param {string} name @param {'-u' | '-g'} which @returns {number | null} */
function numberOf(name, which) {
  const answer = spawnSync('id', [which, name], { encoding: 'utf8' })
  return answer.status === 0 ? Number(answer.stdout) : null
}

/**
 * PostgreSQL refuses to run as root. Under root it runs as an unprivileged account that every Linux has; the account of
 * an existing cluster is kept, since the server insists on owning its files.
 * @param {string} dataDir
 * @param {number | undefined} [caller] the account that starts us
 * @returns {Account}
 */
export function chooseAccount(dataDir, caller = process.getuid?.()) {
  const existing = fs.existsSync(path.join(dataDir, 'PG_VERSION')) ? fs.statSync(dataDir) : null
  if (caller !== 0) {
    if (existing && caller !== undefined && existing.uid !== caller) {
      throw new Failure(
        `The database folder ${dataDir} belongs to another account (uid ${existing.uid}): start Breakaway as that account or as root, or set DATA_DIR to another folder.`,
      )
    }
    return {}
  }
  if (existing && existing.uid !== 0) return { uid: existing.uid, gid: existing.gid }
  for (const name of ['postgres', 'nobody']) {
    const uid = numberOf(name, '-u')
    const gid = numberOf(name, '-g')
    if (uid && gid !== null) return { uid, gid }
  }
  throw new Failure(
    'PostgreSQL does not run as root and this machine has no account "postgres" or "nobody": start Breakaway as another account.',
  )
}

/** @param {Account} account @param {string} folder @returns {boolean} */
function canEnter(account, folder) {
  const answer = spawnSync('/bin/sh', ['-c', 'cd "$1"', 'sh', folder], { ...account, stdio: 'ignore', cwd: '/' })
  return answer.status === 0
}

/**
 * Where the cluster really lies: the folder asked for, or, when root's service account cannot reach that one, a folder of
 * its own under /var/tmp (named after the one asked for, so that the next start finds it again).
 * @param {string} wanted absolute path
 * @returns {{ dataDir: string, account: Account }}
 */
export function placeCluster(wanted) {
  fs.mkdirSync(path.dirname(wanted), { recursive: true })
  const account = chooseAccount(wanted)
  if (account.uid === undefined || canEnter(account, path.dirname(wanted))) return { dataDir: wanted, account }
  const name = `breakaway-data-${crypto.createHash('sha256').update(wanted).digest('hex').slice(0, 12)}`
  const folder = path.join('/var/tmp', name)
  fs.mkdirSync(folder, { recursive: true, mode: 0o711 })
  if (fs.lstatSync(folder).uid !== 0) throw new Failure(`${folder} was not made by root: remove it and start again.`)
  const dataDir = path.join(folder, path.basename(wanted))
  return { dataDir, account: chooseAccount(dataDir) }
}
