// @ts-check
import { pause } from '../pause.mjs'

/** @typedef {import('node:child_process').ChildProcess} ChildProcess */

/** Seconds before a process that ended by itself is started again: doubled each time, from the first to the last. */
const firstDelay = 0.5
const lastDelay = 30
/** A process that ran this long, in seconds, is taken to be sound again. */
const sound = 60

/** @param {number} failures in a row @returns {number} seconds */
export const restartDelay = (failures) => Math.min(firstDelay * 2 ** (failures - 1), lastDelay)

/** @param {ChildProcess} child @returns {boolean} */
const hasEnded = (child) => child.exitCode !== null || child.signalCode !== null

/**
 * Asks a process to end and insists after a while.
 * @param {ChildProcess} child
 * @param {number} patience milliseconds
 */
export async function endChild(child, patience) {
  if (hasEnded(child) || child.pid === undefined) return
  const ended = new Promise((resolve) => child.once('exit', resolve))
  child.kill('SIGTERM')
  await Promise.race([ended, pause(patience)])
  if (!hasEnded(child)) {
    child.kill('SIGKILL')
    await ended
  }
}

/**
 * @typedef {object} Kept a process that is started again whenever it ends
 * @property {() => number | undefined} pid
 * @property {() => number} failures how often in a row it ended by itself
 * @property {() => Promise<void>} restart ends it on purpose and starts it at once
 * @property {(patience: number) => Promise<void>} stop for good; it may take that many milliseconds before it is killed
 */

/**
 * @param {object} what
 * @param {() => ChildProcess} what.launch
 * @param {(how: string, delay: number) => void} what.onCrash told how it ended and in how many seconds it starts again
 * @param {() => void} [what.onStart] told whenever there is a new process
 * @returns {Kept}
 */
export function keepRunning({ launch, onCrash, onStart = () => {} }) {
  let failures = 0
  let stopped = false
  /** @type {NodeJS.Timeout | undefined} */
  let waiting
  /** @type {ChildProcess} */
  let child

  const start = () => {
    const began = performance.now()
    const started = launch()
    child = started
    /** @param {string} how */
    const crashed = (how) => {
      // a process that was replaced or stopped on purpose ended because it was told to
      if (stopped || child !== started) return
      failures = (performance.now() - began) / 1000 > sound ? 1 : failures + 1
      const delay = restartDelay(failures)
      onCrash(how, delay)
      waiting = setTimeout(start, delay * 1000)
    }
    started.once('exit', (code, signal) => crashed(signal ? `signal ${signal}` : `exit status ${code}`))
    started.once('error', (error) => crashed(error.message))
    onStart()
  }
  start()

  return {
    pid: () => child.pid,
    failures: () => failures,
    restart: async () => {
      clearTimeout(waiting)
      const old = child
      if (stopped) return
      start()
      await endChild(old, 10_000)
    },
    stop: async (patience) => {
      stopped = true
      clearTimeout(waiting)
      await endChild(child, patience)
    },
  }
}
