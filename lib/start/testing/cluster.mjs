// @ts-check
import { withClient } from '../embedded/owner.mjs'
import { startCluster } from '../embedded/server.mjs'
import { withLock } from '../lock.mjs'
import { inRoot } from '../root.mjs'
import { leasesIn } from './leases.mjs'

const dataDir = inRoot('.data', 'test', 'pg')
const leases = leasesIn(inRoot('.data', 'test', 'leases'))
const lock = inRoot('.data', 'test', 'cluster.lock')

/** Test databases are thrown away: nothing is lost by not waiting for the disk. */
const throwAway = { fsync: 'off', synchronous_commit: 'off', full_page_writes: 'off', autovacuum: 'off' }

/** Databases of test runs that were killed; nobody uses them when the server has just started. @param {string} adminUrl */
const removeForgotten = (adminUrl) =>
  withClient(adminUrl, async (client) => {
    const { rows } = await client.query(
      "select datname from pg_database where not datistemplate and datname <> 'postgres' and datname not like 'template\\_%'",
    )
    for (const { datname } of rows) await client.query(`drop database ${client.escapeIdentifier(datname)} with (force)`)
  })

/**
 * The tests' own server, whatever `DATABASE_URL` says; it is shared by test runs at the same time.
 * @returns {Promise<import('../embedded/server.mjs').Cluster>}
 */
export const joinTestCluster = () =>
  withLock(lock, async () => {
    leases.take()
    const cluster = await startCluster({ dataDir, createDatabases: true, extra: throwAway })
    if (!cluster.reused) await removeForgotten(cluster.adminUrl('postgres'))
    return cluster
  })

/** Leaves the server and stops it when nobody else uses it. @param {import('../embedded/server.mjs').Cluster} cluster */
export const leaveTestCluster = (cluster) =>
  withLock(lock, async () => {
    if (leases.leave()) await cluster.stop()
  })
