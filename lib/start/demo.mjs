// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { bundleOf } from './entries.mjs'
import { Failure } from './failure.mjs'
import { root } from './root.mjs'
import { lastLines, runNode } from './run-step.mjs'

/** @typedef {{ name: string, role?: string, email: string, password: string, passphrase?: string, keyFile?: string }} DemoPerson */

/**
 * Fills an empty database with the demo plant and its people; a database that holds anything is left as it is (the seed sees to that).
 * @param {string} databaseUrl
 * @param {string} peopleFile where the seed writes how its people sign in
 * @param {Record<string, string | undefined>} env
 */
export async function seedDemo(databaseUrl, peopleFile, env) {
  fs.mkdirSync(path.dirname(peopleFile), { recursive: true, mode: 0o700 })
  const outcome = await runNode([bundleOf('seed')], {
    ...env,
    DATABASE_URL: databaseUrl,
    DEMO_SECRETS_FILE: peopleFile,
  })
  if (outcome.status !== 0) {
    throw new Failure(`${lastLines(outcome, 20)}\nThe demo plant could not be made: the lines above say why.`)
  }
}

/** @param {string} peopleFile @returns {DemoPerson[]} empty when there are none */
export function readDemoPeople(peopleFile) {
  if (!fs.existsSync(peopleFile)) return []
  return JSON.parse(fs.readFileSync(peopleFile, 'utf8')).people
}

/**
 * @param {DemoPerson[]} people
 * @returns {string[]} one line a person, in columns under a heading
 */
export function peopleTable(people) {
  const rows = [
    ['name', 'role', 'sign-in', 'password', 'signing passphrase', 'signing key'],
    ...people.map(({ name, role = '', email, password, passphrase = '', keyFile }) => {
      const key = keyFile ? path.relative(root, keyFile) : ''
      return [name, role, email, password, passphrase, key]
    }),
  ]
  const widths = rows[0]?.map((_, column) => Math.max(...rows.map((row) => row[column]?.length ?? 0))) ?? []
  return rows.map((row) =>
    row
      .map((cell, column) => cell.padEnd(widths[column] ?? 0))
      .join('  ')
      .trimEnd(),
  )
}
