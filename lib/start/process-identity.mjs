// @ts-check
import { spawnSync } from 'node:child_process'
import fs from 'node:fs'

/**
 * When a process began, as the system prints it. A process id alone is reused by the system; with its beginning it names one process.
 * @param {number} pid
 * @returns {string | null} null when there is no such process or the system does not tell
 */
export function beginningOf(pid) {
  if (process.platform === 'linux') {
    try {
      const stat = fs.readFileSync(`/proc/${pid}/stat`, 'utf8')
      // the command name in parentheses may hold spaces: count fields after it (field 3 is the state, 22 the beginning)
      const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ')
      return fields[0] === 'Z' ? null : (fields[19] ?? null)
    } catch {
      return null
    }
  }
  if (process.platform === 'win32') return null
  const answer = spawnSync('ps', ['-o', 'lstart=', '-p', String(pid)], { encoding: 'utf8' })
  return answer.status === 0 ? answer.stdout.trim() || null : null
}

/** @param {number} pid @returns {boolean} whether a process of this id exists, of whatever account */
export function isAlive(pid) {
  try {
    process.kill(pid, 0)
  } catch (error) {
    return /** @type {NodeJS.ErrnoException} */ (error).code === 'EPERM'
  }
  return process.platform !== 'linux' || beginningOf(pid) !== null
}

/** @typedef {{ pid: number, began: string | null }} ProcessIdentity */

/** @param {number} pid @returns {ProcessIdentity} */
export const identify = (pid) => ({ pid, began: beginningOf(pid) })

/**
 * Whether the recorded process still runs. Where the system tells no beginning the id alone decides.
 * @param {ProcessIdentity} recorded
 * @returns {boolean}
 */
export function stillRuns({ pid, began }) {
  if (!isAlive(pid)) return false
  return began === null || beginningOf(pid) === began
}
