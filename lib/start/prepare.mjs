// @ts-check
import { ensureBuild } from './build.mjs'
import { ensureBundles } from './bundle.mjs'
import { ensureClient } from './generate.mjs'
import { withLock } from './lock.mjs'
import { ensurePackages } from './packages.mjs'
import { inRoot } from './root.mjs'

/** @typedef {(line: string) => void} Say */

/**
 * One command at a time changes packages, generated code, bundles and builds of this folder.
 * @template T
 * @param {Say} say
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
const alone = (say, work) =>
  withLock(inRoot('.data', 'start.lock'), work, (pid) =>
    say(`Waiting for another command of this project (process ${pid})`),
  )

/** What a program that runs under Node needs: packages, the database client, bundles. @param {Say} say */
export const preparePrograms = (say) =>
  alone(say, async () => {
    await ensurePackages(say)
    await ensureClient()
    await ensureBundles(say)
  })

/** The application's build. @param {Say} say @returns {Promise<string>} absolute path of the server to run */
export const prepareApplication = (say) => alone(say, () => ensureBuild(say))
