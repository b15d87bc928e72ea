// @ts-check
import { spawn } from 'node:child_process'
import { root } from './root.mjs'

/** @typedef {{ status: number, stdout: string, stderr: string, seconds: number }} StepOutcome */

/** Nothing is reported to anybody, and no step asks for news. */
const quietTools = { NEXT_TELEMETRY_DISABLED: '1', CHECKPOINT_DISABLE: '1', PRISMA_HIDE_UPDATE_MESSAGE: '1' }

/** @type {Set<import('node:child_process').ChildProcess>} */
const running = new Set()

// a command that is told to stop takes the step under way with it
process.on('exit', () => {
  for (const child of running) child.kill('SIGTERM')
})

/**
 * Counts a process among those that end with this one.
 * @template {import('node:child_process').ChildProcess} T
 * @param {T} child
 * @returns {T}
 */
export function endsWithUs(child) {
  running.add(child)
  child.once('close', () => running.delete(child))
  return child
}

/**
 * Runs a program to its end and keeps what it says. Its input is empty, so that nothing can wait for an answer.
 * @param {string} program
 * @param {string[]} args
 * @param {Record<string, string | undefined>} [env] added to the environment
 * @returns {Promise<StepOutcome>}
 */
export function runProgram(program, args, env = {}) {
  const began = performance.now()
  return new Promise((resolve) => {
    const options = { cwd: root, env: { ...process.env, ...quietTools, ...env } }
    const child = endsWithUs(spawn(program, args, { ...options, stdio: ['ignore', 'pipe', 'pipe'] }))
    let stdout = ''
    let stderr = ''
    child.stdout.setEncoding('utf8').on('data', (part) => {
      stdout += part
    })
    child.stderr.setEncoding('utf8').on('data', (part) => {
      stderr += part
    })
    /** @param {number} status */
    const end = (status) => resolve({ status, stdout, stderr, seconds: (performance.now() - began) / 1000 })
    child.once('error', (error) => {
      stderr += error.message
      end(127)
    })
    child.once('close', (status) => end(status ?? 1))
  })
}

/**
 * @param {string[]} args of Node
 * @param {Record<string, string | undefined>} [env]
 */
export const runNode = (args, env) => runProgram(process.execPath, args, env)

/** @param {StepOutcome} outcome @param {number} [lines] @returns {string} the end of what it said */
export const lastLines = ({ stdout, stderr }, lines = 40) =>
  `${stdout}\n${stderr}`.trim().split('\n').slice(-lines).join('\n')

/**
 * Runs Node with output that is shown as it comes.
 * @param {string[]} args
 * @param {Record<string, string | undefined>} [env]
 * @returns {Promise<number>} exit status
 */
export function showNode(args, env = {}) {
  const options = { cwd: root, env: { ...process.env, ...quietTools, ...env } }
  const child = endsWithUs(spawn(process.execPath, args, { ...options, stdio: ['ignore', 'inherit', 'inherit'] }))
  return new Promise((resolve) => child.once('exit', (status) => resolve(status ?? 1)))
}
