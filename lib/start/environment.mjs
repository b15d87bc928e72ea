// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { Failure } from './failure.mjs'
import { inRoot, root } from './root.mjs'

/**
 * @typedef {object} Environment what the person who starts the program chose
 * @property {string | null} databaseUrl null = the embedded database
 * @property {string} dataDir absolute
 * @property {string} secretsDir absolute
 * @property {string} host
 * @property {string | undefined} port
 */

/** @param {string} name @returns {string | undefined} an empty variable counts as absent */
const variable = (name) => process.env[name] || undefined

/** @param {string} host @returns {boolean} whether only this machine can reach it */
export const isLoopback = (host) => host === 'localhost' || host === '::1' || /^127\./.test(host)

/** Reads `.env` (what the environment already holds wins) and then the environment. @returns {Environment} */
export function readEnvironment() {
  const file = inRoot('.env')
  if (fs.existsSync(file)) {
    try {
      process.loadEnvFile(file)
    } catch (error) {
      throw new Failure('.env cannot be read: give the account that starts Breakaway the right to read it.', error)
    }
  }
  return {
    databaseUrl: variable('DATABASE_URL') ?? null,
    dataDir: path.resolve(root, variable('DATA_DIR') ?? '.data'),
    secretsDir: path.resolve(root, variable('SECRETS_DIR') ?? '.secrets'),
    host: variable('HOST') ?? '127.0.0.1',
    port: variable('PORT'),
  }
}
