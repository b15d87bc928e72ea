// @ts-check
import fs from 'node:fs'
import { bundleOf } from '../entries.mjs'
import { Failure } from '../failure.mjs'
import { logOf, startChild } from './child.mjs'
import { waitForHealth } from './health.mjs'
import { keepRunning } from './keep-running.mjs'

/** @typedef {import('./child.mjs').ChildPlan} ChildPlan */
/**
 * @typedef {object} ServicePlan
 * @property {string[]} web arguments of Node for the web process
 * @property {string} address where it will answer
 * @property {string} host
 * @property {number} port
 * @property {Record<string, string | undefined>} env of both processes
 * @property {string} logDir
 * @property {(line: string) => void} say
 * @property {ReturnType<import('../undo-list.mjs').undoList>} undo gets the steps that end both: the web process first
 * @property {(pids: (number | undefined)[]) => void} [onProcesses] told whenever the processes change
 */

/** The web process hangs up its live streams at once; a worker hands its job back or finishes it. Milliseconds. */
const patience = { web: 8_000, worker: 20_000 }

/** @param {ChildPlan} plan @returns {string} */
const lastWords = (plan) => fs.readFileSync(logOf(plan), 'utf8').trim().split('\n').slice(-12).join('\n')

/**
 * Starts one web and one worker process and keeps them running.
 * @param {ServicePlan} what
 * @returns {Promise<{ restartWorker: () => Promise<void> }>} once the application answers
 */
export async function startService({ web, address, host, port, env, logDir, say, undo, onProcesses = () => {} }) {
  /** @type {Record<'web' | 'worker', ChildPlan>} */
  const plans = {
    web: { name: 'web', args: web, env: { ...env, HOSTNAME: host, PORT: String(port) }, logDir },
    worker: { name: 'worker', args: [bundleOf('worker')], env, logDir },
  }
  /** @type {Map<string, import('./keep-running.mjs').Kept>} */
  const kept = new Map()
  const tell = () => onProcesses([...kept.values()].map((one) => one.pid()))
  /** @param {ChildPlan} plan @param {number} limit */
  const keep = (plan, limit) => {
    const one = keepRunning({
      launch: () => startChild(plan),
      onStart: tell,
      onCrash: (how, delay) =>
        say(`The ${plan.name} process ended (${how}) and is started again in ${delay} s: see ${logOf(plan)}`),
    })
    kept.set(plan.name, one)
    undo.add(() => one.stop(limit))
    tell()
    return one
  }
  const workerProcess = keep(plans.worker, patience.worker)
  const webProcess = keep(plans.web, patience.web)
  const healthy = await waitForHealth(address, { seconds: 90, givenUp: () => webProcess.failures() >= 3 })
  if (healthy) return { restartWorker: workerProcess.restart }
  throw new Failure(
    `${lastWords(plans.web)}\nThe application does not answer at ${address}: the lines above are from ${logOf(plans.web)}.`,
  )
}
