// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { Failure } from './failure.mjs'
import { inRoot } from './root.mjs'
import { lastLines, runNode, runProgram } from './run-step.mjs'
import { readStamp, stampOf, writeStamp } from './stamp.mjs'

/** @typedef {{ packages: Record<string, { version?: string, optional?: boolean }> }} LockFile */

/** Packages with compiled parts differ by these. */
const machine = `${process.versions.node.split('.')[0]} ${process.platform} ${process.arch}`

/**
 * Whether what npm last wrote into node_modules is what the lock file asks for. Optional packages may be missing: those of
 * other platforms are.
 * @param {LockFile} wanted
 * @param {LockFile} installed
 * @returns {boolean}
 */
export function satisfies(wanted, installed) {
  return Object.entries(wanted.packages).every(([name, { version, optional }]) => {
    if (name === '') return true
    const found = installed.packages[name]
    return found ? found.version === version : optional === true
  })
}

/** @returns {boolean} an installation made by hand (`npm install`) is as good as ours */
function installedByHand() {
  try {
    const wanted = JSON.parse(fs.readFileSync(inRoot('package-lock.json'), 'utf8'))
    return satisfies(wanted, JSON.parse(fs.readFileSync(inRoot('node_modules', '.package-lock.json'), 'utf8')))
  } catch {
    return false
  }
}

/** npm itself: the one that runs us, else the one beside Node, else the one on the path. */
function npm() {
  const beside = path.join(path.dirname(process.execPath), '..', 'lib', 'node_modules', 'npm', 'bin', 'npm-cli.js')
  const program = [process.env.npm_execpath, beside].find((file) => file?.endsWith('.js') && fs.existsSync(file))
  /** @param {string[]} args */
  return (args) => (program ? runNode([program, ...args]) : runProgram('npm', args))
}

/**
 * Installs exactly the packages of the lock file unless they are there for this Node and machine.
 * @param {(line: string) => void} say
 */
export async function ensurePackages(say) {
  const file = inRoot('node_modules', '.breakaway-stamp')
  const lock = stampOf({ paths: ['package-lock.json', '.npmrc'] })
  const stamp = `${machine} ${lock}`
  const found = readStamp(file)
  if (found === stamp) return
  const sameMachine = found === null || found.startsWith(`${machine} `)
  if (!(sameMachine && installedByHand())) {
    say('Installing packages (a minute or two)')
    const outcome = await npm()(['ci', '--include=dev', '--no-audit', '--no-fund', '--loglevel=error'])
    if (outcome.status !== 0) {
      throw new Failure(
        `${lastLines(outcome, 15)}\nThe packages could not be installed: check the connection to the package registry and the disk space, then start again.`,
      )
    }
  }
  writeStamp(file, stamp)
}
