// @ts-check
import crypto from 'node:crypto'
import { ensureBundles } from '../bundle.mjs'
import { withClient } from '../embedded/owner.mjs'
import { bundleOf } from '../entries.mjs'
import { Failure } from '../failure.mjs'
import { withLock } from '../lock.mjs'
import { applyMigrations } from '../migrate/apply.mjs'
import { inRoot } from '../root.mjs'
import { lastLines, runNode } from '../run-step.mjs'
import { stampOf } from '../stamp.mjs'

/** @typedef {{ url: string, drop: () => Promise<void> }} FreshDatabase */

/** @param {string} url @param {string} database @returns {string} the same server and role, another database */
export function onDatabase(url, database) {
  const address = new URL(url)
  address.pathname = `/${database}`
  return address.href
}

/** A template is named after what it is made of, so it is made anew when migrations or queues change. */
const templateName = () =>
  `template_${stampOf({ paths: ['prisma/migrations', 'lib/server/jobs/queues.ts', 'lib/server/console/queues.ts', 'package-lock.json'] })}`

/**
 * Makes the migrated, empty database with its queues that test databases are copied from, unless it is there.
 * @param {string} serverUrl of the tests' role, which may make databases
 * @returns {Promise<string>} its name
 */
export function ensureTemplate(serverUrl) {
  return withLock(inRoot('.data', 'test', 'template.lock'), async () => {
    const name = templateName()
    const maintenance = onDatabase(serverUrl, 'postgres')
    const { rows } = await withClient(maintenance, (client) =>
      client.query("select datname from pg_database where datname like 'template\\_%'"),
    )
    if (rows.some((row) => row.datname === name)) return name
    const unfinished = `unfinished_${name}`
    await withClient(maintenance, async (client) => {
      for (const { datname } of rows) await client.query(`drop database if exists ${datname} with (force)`)
      await client.query(`drop database if exists ${unfinished} with (force)`)
      await client.query(`create database ${unfinished}`)
    })
    const url = onDatabase(serverUrl, unfinished)
    await applyMigrations(url)
    await ensureBundles(() => {})
    const queues = await runNode([bundleOf('queues')], { DATABASE_URL: url })
    if (queues.status !== 0)
      throw new Failure(`${lastLines(queues)}\nThe queues of the test database could not be made.`)
    await withClient(maintenance, (client) => client.query(`alter database ${unfinished} rename to ${name}`))
    return name
  })
}

/**
 * A database of one's own, copied from the template.
 * @param {string} serverUrl
 * @param {string} template
 * @returns {Promise<FreshDatabase>}
 */
export async function copyTemplate(serverUrl, template) {
  const name = `test_${crypto.randomUUID().replaceAll('-', '')}`
  const maintenance = onDatabase(serverUrl, 'postgres')
  await withClient(maintenance, (client) => client.query(`create database ${name} template ${template}`))
  return {
    url: onDatabase(serverUrl, name),
    drop: async () => {
      await withClient(maintenance, (client) => client.query(`drop database if exists ${name} with (force)`))
    },
  }
}
