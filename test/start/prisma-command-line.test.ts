import { spawnSync } from 'node:child_process'
import fs from 'node:fs'
import path from 'node:path'
import { beforeEach, expect, onTestFinished, test } from 'vitest'
import { inRoot, root } from '@/lib/start/root.mjs'
import { toolPath } from '@/lib/start/tools.mjs'
import { freshDatabase } from '../support/database'
import { ownFolder } from '../support/own-folder'

const model = 'model Note {\n  id Int @id\n  words String\n}\n'
let folder = ''
let url = ''

/** Runs Prisma's own command line on a small schema; the stand-in answers in place of its native engine. */
function prisma(...args: string[]) {
  const { status, stdout, stderr } = spawnSync(
    process.execPath,
    [toolPath('prisma'), ...args, '--config', path.join(folder, 'config.ts')],
    { cwd: root, encoding: 'utf8', env: { ...process.env, DATABASE_URL: url, CHECKPOINT_DISABLE: '1' } },
  )
  return { status, said: `${stdout}\n${stderr}` }
}

const migrations = (): string[] => fs.readdirSync(path.join(folder, 'migrations')).filter((name) => /^\d/.test(name))

beforeEach(async () => {
  // a name of its own that does not exist yet: the command line makes the database itself
  const fresh = await freshDatabase()
  await fresh.drop()
  url = fresh.url
  onTestFinished(fresh.drop)
  folder = ownFolder()
  fs.mkdirSync(path.join(folder, 'migrations'))
  fs.writeFileSync(path.join(folder, 'schema.prisma'), `datasource db {\n  provider = "postgresql"\n}\n${model}`)
  const engine = JSON.stringify(inRoot('lib/start/migrate/prisma-schema-engine.mjs'))
  fs.writeFileSync(
    path.join(folder, 'config.ts'),
    `import { defineConfig } from 'prisma/config'
    process.env.PRISMA_SCHEMA_ENGINE_BINARY = ${engine}
    export default defineConfig({ schema: ${JSON.stringify(path.join(folder, 'schema.prisma'))},
      migrations: { path: ${JSON.stringify(path.join(folder, 'migrations'))} }, datasource: { url: process.env.DATABASE_URL ?? '' } })`,
  )
})

test('a migration is written, applied, found without drift, and a changed schema is found to differ', () => {
  const made = prisma('migrate', 'dev', '--create-only', '--name', 'first')
  expect(made, made.said).toMatchObject({ status: 0 })
  expect(migrations()).toHaveLength(1)
  const script = path.join(folder, 'migrations', migrations()[0] ?? '', 'migration.sql')
  expect(fs.readFileSync(script, 'utf8')).toContain('CREATE TABLE "Note"')
  const applied = prisma('migrate', 'deploy')
  expect(applied, applied.said).toMatchObject({ status: 0 })
  const compare = [
    'migrate',
    'diff',
    '--from-migrations',
    path.join(folder, 'migrations'),
    '--to-schema',
    path.join(folder, 'schema.prisma'),
    '--exit-code',
  ]
  expect(prisma(...compare).said).toContain('No difference detected')
  fs.appendFileSync(path.join(folder, 'schema.prisma'), 'model Other {\n  id Int @id\n}\n')
  const changed = prisma(...compare)
  expect(changed.said).toContain('Other')
  expect(changed.status).toBe(2)
})
