// @ts-check
import crypto from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { Failure } from './failure.mjs'

/** The application's secrets: sessions and codes are signed with the first, issuing keys are wrapped with the second. */
export const secretNames = /** @type {const} */ (['BETTER_AUTH_SECRET', 'CA_WRAP_SECRET'])

/** @typedef {Record<(typeof secretNames)[number], string>} Secrets */

/** A secret shorter than this can be guessed. */
const leastLength = 32

/** @param {string} secretsDir @returns {string} sign-in of the demo people, written by the seed */
export const demoPeopleFile = (secretsDir) => path.join(secretsDir, 'demo-people.json')

/** @param {string} file @returns {Partial<Secrets>} */
function readKept(file) {
  const stat = fs.statSync(file, { throwIfNoEntry: false })
  if (!stat) return {}
  if (process.platform !== 'win32' && stat.mode & 0o077) {
    throw new Failure(`The secrets in ${file} can be read by other accounts: run "chmod 600 ${file}" and start again.`)
  }
  try {
    return JSON.parse(fs.readFileSync(file, 'utf8'))
  } catch (error) {
    throw new Failure(
      `The secrets in ${file} cannot be read: restore the file from a backup (without it, signed-in people and the issuing keys are lost).`,
      error,
    )
  }
}

/**
 * The secrets from the environment, else from the file made at the first start, which only its owner may read.
 * @param {string} secretsDir
 * @param {Record<string, string | undefined>} [environment]
 * @returns {Secrets}
 */
export function ensureSecrets(secretsDir, environment = process.env) {
  const file = path.join(secretsDir, 'application.json')
  const kept = readKept(file)
  /** @type {Partial<Secrets>} */
  const made = {}
  const secrets = /** @type {Secrets} */ ({})
  for (const name of secretNames) {
    const given = environment[name]
    if (given && given.length < leastLength) {
      throw new Failure(`${name} is too short: give it at least ${leastLength} random characters, or leave it out.`)
    }
    const value = given || kept[name] || crypto.randomBytes(32).toString('base64url')
    if (!given && !kept[name]) made[name] = value
    secrets[name] = value
  }
  if (Object.keys(made).length > 0) {
    fs.mkdirSync(secretsDir, { recursive: true, mode: 0o700 })
    const unfinished = `${file}.${process.pid}`
    fs.writeFileSync(unfinished, `${JSON.stringify({ ...kept, ...made }, null, 2)}\n`, { mode: 0o600 })
    fs.renameSync(unfinished, file)
  }
  return secrets
}
