// @ts-check
import crypto from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { pause } from './pause.mjs'
import { identify, stillRuns } from './process-identity.mjs'

/** @type {Set<string>} */
const held = new Set()

process.on('exit', () => {
  for (const file of held) fs.rmSync(file, { force: true })
})

/** @param {string} file @returns {import('./process-identity.mjs').ProcessIdentity | null} */
function holderOf(file) {
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'))
  } catch {
    return null
  }
}

/**
 * The name appears together with its content (a hard link of a finished file), so a killed process never leaves an empty lock.
 * @param {string} file
 * @returns {boolean}
 */
function take(file) {
  const own = `${file}.${process.pid}-${crypto.randomUUID()}`
  fs.writeFileSync(own, JSON.stringify(identify(process.pid)), { mode: 0o600 })
  try {
    fs.linkSync(own, file)
    held.add(file)
    return true
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === 'EEXIST') return false
    throw error
  } finally {
    fs.rmSync(own, { force: true })
  }
}

/**
 * Puts aside the lock of a dead process. The file is renamed first and read again: if another process was quicker and
 * the name now belongs to it, its lock is given back.
 * @param {string} file
 */
function breakLock(file) {
  const aside = `${file}.stale-${crypto.randomUUID()}`
  try {
    fs.renameSync(file, aside)
  } catch {
    return
  }
  const holder = holderOf(aside)
  if (holder && stillRuns(holder)) {
    try {
      fs.linkSync(aside, file)
    } catch {
      // a third process took the free name meanwhile; the work under the lock is safe to repeat
    }
  }
  fs.rmSync(aside, { force: true })
}

/**
 * Runs `work` while no other process holds the lock file; waits for a living holder and takes over from a dead one.
 * @template T
 * @param {string} file
 * @param {() => Promise<T>} work
 * @param {(holder: number) => void} [onWait] told once when another living process holds the lock
 * @returns {Promise<T>}
 */
export async function withLock(file, work, onWait) {
  fs.mkdirSync(path.dirname(file), { recursive: true })
  let told = false
  while (!take(file)) {
    const holder = holderOf(file)
    if (holder && !stillRuns(holder)) {
      breakLock(file)
      continue
    }
    if (holder && !told) {
      told = true
      onWait?.(holder.pid)
    }
    await pause(50)
  }
  try {
    return await work()
  } finally {
    held.delete(file)
    fs.rmSync(file, { force: true })
  }
}
