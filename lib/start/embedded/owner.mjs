// @ts-check
import pg from 'pg'

/**
 * The application's role: it owns its database and is neither superuser nor free of row-level security, so that the
 * policies, which are forced, hold for the application itself.
 */
export const ownerRole = 'breakaway'

/**
 * @template T
 * @param {string} url
 * @param {(client: pg.Client) => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function withClient(url, work) {
  const client = new pg.Client({ connectionString: url, options: '-c timezone=UTC' })
  // a lost connection makes the query under way fail; the event alone must not end the process
  client.on('error', () => {})
  await client.connect()
  try {
    return await work(client)
  } finally {
    await client.end()
  }
}

/**
 * @param {string} adminUrl
 * @param {string} password
 * @param {boolean} createDatabases
 */
export async function ensureOwner(adminUrl, password, createDatabases) {
  await withClient(adminUrl, async (client) => {
    const { rowCount } = await client.query('select 1 from pg_roles where rolname = $1', [ownerRole])
    const rights = `nosuperuser nobypassrls nocreaterole ${createDatabases ? 'createdb' : 'nocreatedb'}`
    const secret = client.escapeLiteral(password)
    await client.query(`${rowCount ? 'alter' : 'create'} role ${ownerRole} login ${rights} password ${secret}`)
  })
}

/**
 * Makes the database for the application's role unless it is there.
 * @param {import('./server.mjs').Cluster} cluster
 * @param {string} database
 */
export async function ensureDatabase(cluster, database) {
  await withClient(cluster.adminUrl('postgres'), async (client) => {
    const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [database])
    if (rowCount) return
    try {
      await client.query(`create database ${client.escapeIdentifier(database)} owner ${ownerRole}`)
    } catch (error) {
      // two processes asked at once: either code tells that the other one made it
      const { code } = /** @type {{ code?: string }} */ (error)
      if (code !== '42P04' && code !== '23505') throw error
    }
  })
}
