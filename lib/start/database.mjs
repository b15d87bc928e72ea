// @ts-check
import path from 'node:path'
import { ensureDatabase } from './embedded/owner.mjs'
import { startCluster } from './embedded/server.mjs'
import { bundleOf } from './entries.mjs'
import { Failure } from './failure.mjs'
import { acceptDatabase } from './migrate/accept.mjs'
import { applyMigrations } from './migrate/apply.mjs'
import { lastLines, runNode } from './run-step.mjs'

/** The application's database in the embedded cluster. */
const databaseName = 'breakaway'

/**
 * Brings a database to this version: checks it, applies migrations, makes the queues.
 * @param {string} url
 * @returns {Promise<string[]>} migrations applied now
 */
export async function bringUpToDate(url) {
  await acceptDatabase(url)
  const applied = await applyMigrations(url)
  const queues = await runNode([bundleOf('queues')], { DATABASE_URL: url })
  if (queues.status !== 0) {
    throw new Failure(
      `${lastLines(queues, 12)}\nThe queues could not be made: the user in DATABASE_URL must own the database or have the right to create schemas in it.`,
    )
  }
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
