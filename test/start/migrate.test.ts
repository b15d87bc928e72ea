import crypto from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { expect, onTestFinished, test } from 'vitest'
import { withClient } from '@/lib/start/embedded/owner.mjs'
import { applyMigrations } from '@/lib/start/migrate/apply.mjs'
import { migrationNames } from '@/lib/start/migrate/history.mjs'
import { joinTestCluster } from '@/lib/start/testing/cluster.mjs'
import { onDatabase } from '@/lib/start/testing/template.mjs'
import { ownFolder } from '../support/own-folder'

async function emptyDatabase(): Promise<string> {
  const server = process.env.TEST_CLUSTER_URL ?? (await joinTestCluster()).ownerUrl('postgres')
  const name = `empty_${crypto.randomUUID().replaceAll('-', '')}`
  await withClient(server, (client) => client.query(`create database ${name}`))
  onTestFinished(async () => {
    await withClient(server, (client) => client.query(`drop database ${name} with (force)`))
  })
  return onDatabase(server, name)
}

/** A folder of migrations: the name and the script of each. */
function migrations(scripts: Record<string, string>): string {
  const folder = ownFolder()
  fs.writeFileSync(path.join(folder, 'migration_lock.toml'), 'provider = "postgresql"\n')
  for (const [name, script] of Object.entries(scripts)) {
    fs.mkdirSync(path.join(folder, name))
    fs.writeFileSync(path.join(folder, name, 'migration.sql'), script)
  }
  return folder
}

const tablesOf = (url: string): Promise<string[]> =>
  withClient(url, async (client) => {
    const { rows } = await client.query("select tablename from pg_tables where schemaname = 'public' order by 1")
    return rows.map((row) => row.tablename)
  })

test('an empty database gets every migration, and the next start finds nothing to do', async () => {
  const url = await emptyDatabase()
  expect(await applyMigrations(url)).toEqual(migrationNames())
  expect(await applyMigrations(url)).toEqual([])
})

test('three processes that migrate at once apply each migration once', async () => {
  const url = await emptyDatabase()
  const applied = await Promise.all([applyMigrations(url), applyMigrations(url), applyMigrations(url)])
  expect(applied.flat().sort()).toEqual(migrationNames())
})

test('a function whose body holds semicolons arrives whole', async () => {
  const url = await emptyDatabase()
  const folder = migrations({
    '20200101000000_first': `create table a (n int);
      create function twice(n int) returns int language plpgsql as $$ begin n := n * 2; return n; end; $$;
      insert into a values (twice(21));`,
  })
  await applyMigrations(url, folder)
  expect(await withClient(url, async (client) => (await client.query('select n from a')).rows)).toEqual([{ n: 42 }])
})

test('a migration that fails half way leaves nothing of itself and says why', async () => {
  const url = await emptyDatabase()
  const folder = migrations({
    '20200101000000_first': 'create table a (n int);',
    '20200102000000_second': 'create table b (n int); insert into missing values (1);',
  })
  await expect(applyMigrations(url, folder)).rejects.toThrow(/could not be brought to this version .*missing/)
  expect(await tablesOf(url)).toEqual(['_prisma_migrations', 'a'])
})
