// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { inRoot } from '../root.mjs'

export const migrationsFolder = inRoot('prisma', 'migrations')

/** @param {string} [folder] @returns {string[]} the migrations of this version of the code, oldest first */
export function migrationNames(folder = migrationsFolder) {
  return fs
    .readdirSync(folder, { withFileTypes: true })
    .filter((entry) => entry.isDirectory())
    .map((entry) => entry.name)
    .sort()
}

/**
 * The migrations as the schema engine takes them.
 * @param {string} [folder]
 * @returns {import('@prisma/schema-engine-wasm/schema_engine_bg').MigrationList}
 */
export function readMigrations(folder = migrationsFolder) {
  return {
    baseDir: folder,
    lockfile: {
      path: 'migration_lock.toml',
      content: fs.readFileSync(path.join(folder, 'migration_lock.toml'), 'utf8'),
    },
    shadowDbInitScript: '',
    migrationDirectories: migrationNames(folder).map((name) => ({
      path: name,
      migrationFile: {
        path: 'migration.sql',
        content: { tag: 'ok', value: fs.readFileSync(path.join(folder, name, 'migration.sql'), 'utf8') },
      },
    })),
  }
}
