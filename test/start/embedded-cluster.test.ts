import fs from 'node:fs'
import path from 'node:path'
import pg from 'pg'
import { afterAll, beforeAll, expect, test } from 'vitest'
import { ensureDatabase, withClient } from '@/lib/start/embedded/owner.mjs'
import { type Cluster, startCluster } from '@/lib/start/embedded/server.mjs'
import { inRoot } from '@/lib/start/root.mjs'
import { ownClusterFolder } from '../support/own-cluster'

// making a cluster takes seconds: the tests of this file share one, in the order of their lines
const folder = inRoot('.data', 'test', `own-${process.pid}-embedded`)
let cluster: Cluster

beforeAll(async () => {
  cluster = await startCluster({ dataDir: path.join(folder, 'pg') })
})

afterAll(async () => {
  await cluster.stop()
  fs.rmSync(folder, { recursive: true, force: true })
})

async function one(url: string, sql: string): Promise<Record<string, unknown>> {
  return withClient(url, async (client) => (await client.query(sql)).rows[0])
}

test('the first start makes a server that listens on this machine only and speaks UTC', async () => {
  expect(cluster.reused).toBe(false)
  const settings = await one(
    cluster.adminUrl('postgres'),
    `select current_setting('listen_addresses') as addresses, current_setting('TimeZone') as zone,
            current_setting('max_connections')::int as connections, current_setting('data_checksums') as checksums,
            current_setting('fsync') as fsync, current_setting('server_version_num')::int / 10000 as major`,
  )
  expect(settings).toEqual({
    addresses: '127.0.0.1',
    zone: 'UTC',
    connections: 100,
    checksums: 'on',
    fsync: 'on',
    major: 18,
  })
})

test('the role of the application is bound by row-level security and makes no databases', async () => {
  await ensureDatabase(cluster, 'records')
  const role = await one(
    cluster.ownerUrl('records'),
    'select rolsuper, rolbypassrls, rolcreatedb, rolcreaterole from pg_roles where rolname = current_user',
  )
  expect(role).toEqual({ rolsuper: false, rolbypassrls: false, rolcreatedb: false, rolcreaterole: false })
  await withClient(cluster.ownerUrl('records'), async (client) => {
    await client.query(`create table note (org text, words text);
      alter table note enable row level security; alter table note force row level security;
      create policy own on note using (org = current_setting('app.org', true));
      insert into note select 'a', 'hidden' where false`)
    await expect(client.query("insert into note values ('a', 'x')")).rejects.toThrow('row-level security')
  })
})

test('the passwords lie in a file that only its owner can read, and a wrong one is refused', async () => {
  expect(fs.statSync(`${cluster.dataDir}.passwords`).mode & 0o777).toBe(0o600)
  const wrong = new URL(cluster.ownerUrl('postgres'))
  wrong.password = 'guess'
  const client = new pg.Client({ connectionString: wrong.href })
  await expect(client.connect()).rejects.toThrow('password authentication failed')
})

test('a starter on the same folder uses the server that runs', async () => {
  const again = await startCluster({ dataDir: cluster.dataDir })
  expect(again.reused).toBe(true)
  expect(again.pid).toBe(cluster.pid)
})

test('after a stop the server comes back at the same port with the same data', async () => {
  await withClient(cluster.ownerUrl('records'), (client) => client.query('create table kept as select 42 as n'))
  const { port, pid } = cluster
  await cluster.stop()
  cluster = await startCluster({ dataDir: cluster.dataDir })
  expect(cluster.port).toBe(port)
  expect(cluster.pid).not.toBe(pid)
  expect(await one(cluster.ownerUrl('records'), 'select n from kept')).toEqual({ n: 42 })
})

test('three first starters at once make one server and clear away what a killed one left', async () => {
  const dataDir = ownClusterFolder()
  fs.mkdirSync(`${dataDir}.unfinished-1/base`, { recursive: true })
  const clusters = await Promise.all([1, 2, 3].map(() => startCluster({ dataDir })))
  expect(new Set(clusters.map(({ pid }) => pid)).size).toBe(1)
  expect(clusters.filter(({ reused }) => !reused)).toHaveLength(1)
  expect(fs.existsSync(`${dataDir}.unfinished-1`)).toBe(false)
})

test('without its passwords an existing database is not replaced but the remedy is named', async () => {
  await cluster.stop()
  fs.rmSync(`${cluster.dataDir}.passwords`)
  await expect(startCluster({ dataDir: cluster.dataDir })).rejects.toThrow('restore that file from a backup')
  expect(fs.existsSync(path.join(cluster.dataDir, 'PG_VERSION'))).toBe(true)
})
