// @ts-check
import path from 'node:path'
import { ensureDatabase, withClient } from './embedded/owner.mjs'
import { startCluster } from './embedded/server.mjs'
import { bundleOf } from './entries.mjs'
import { Failure } from './failure.mjs'
import { acceptDatabase } from './migrate/accept.mjs'
import { applyMigrations } from './migrate/apply.mjs'
import { lastLines, runNode } from './run-step.mjs'
import { stampOf } from './stamp.mjs'

/** The application's database in the embedded cluster. */
const databaseName = 'breakaway'

/** The queue's tables carry what they were made of, so that a start with nothing new need not run a program for it. */
const queueStamp = () => stampOf({ paths: ['.jobs/queues.js', 'node_modules/pg-boss/package.json'] })

/** @param {string} url */
async function ensureQueues(url) {
  const stamp = queueStamp()
  const made = await withClient(url, async (client) => {
    const { rows } = await client.query("select obj_description(to_regnamespace('pgboss')) as stamp")
    return rows[0].stamp
  })
  if (made === stamp) return
  const queues = await runNode([bundleOf('queues')], { DATABASE_URL: url })
  if (queues.status !== 0) {
    throw new Failure(
      `${lastLines(queues, 12)}\nThe queues could not be made: the user in DATABASE_URL must own the database or have the right to create schemas in it.`,
    )
  }
  await withClient(url, (client) => client.query(`comment on schema pgboss is ${client.escapeLiteral(stamp)}`))
}

/**
 * Brings a database to this version: checks it, applies migrations, makes the queues.
 * @param {string} url
 * @returns {Promise<string[]>} migrations applied now
 */
export async function bringUpToDate(url) {
  await acceptDatabase(url)
  const applied = await applyMigrations(url)
  await ensureQueues(url)
  return applied
}

/**
 * Starts the embedded server of a data folder with the application's database in it.
 * @param {string} dataDir
 * @returns {Promise<{ url: string, cluster: import('./embedded/server.mjs').Cluster }>}
 */
export async function startEmbedded(dataDir) {
  const cluster = await startCluster({ dataDir: path.join(dataDir, 'pg') })
  await ensureDatabase(cluster, databaseName)
  return { url: cluster.ownerUrl(databaseName), cluster }
}
