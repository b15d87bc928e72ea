// @ts-check
import { spawn } from 'node:child_process'
import fs from 'node:fs'
import path from 'node:path'
import { root } from '../root.mjs'

/** A log larger than this is put aside at the next start of its process; one earlier log is kept. */
const largestLog = 5_000_000

/**
 * @typedef {object} ChildPlan
 * @property {string} name of the log file, and in messages
 * @property {string[]} args of Node
 * @property {Record<string, string | undefined>} env the whole environment
 * @property {string} logDir
 */

/** @param {ChildPlan} plan @returns {string} */
export const logOf = ({ name, logDir }) => path.join(logDir, `${name}.log`)

/**
 * Starts a process whose output goes to a file. It has a group of its own: Ctrl+C reaches the launcher only, which ends
 * its processes in order.
 * @param {ChildPlan} plan
 */
export function startChild(plan) {
  const log = logOf(plan)
  fs.mkdirSync(plan.logDir, { recursive: true })
  if ((fs.statSync(log, { throwIfNoEntry: false })?.size ?? 0) > largestLog) fs.renameSync(log, `${log}.previous`)
  const output = fs.openSync(log, 'a', 0o600)
  fs.writeSync(output, `--- ${new Date().toISOString()} ${plan.name} starts\n`)
  const child = spawn(process.execPath, ['--enable-source-maps', ...plan.args], {
    cwd: root,
    env: plan.env,
    stdio: ['ignore', output, output],
    detached: process.platform !== 'win32',
  })
  fs.closeSync(output)
  return child
}
