// @ts-check
import { Failure } from '../failure.mjs'
import { withSchemaEngine } from './engine.mjs'
import { readMigrations } from './history.mjs'

/**
 * Brings a database to this version of the schema; safe when several processes do it at once (the engine holds an
 * advisory lock). Each migration is one transaction.
 * @param {string} url
 * @param {string} [folder]
 * @returns {Promise<string[]>} names of the migrations applied now
 */
export async function applyMigrations(url, folder) {
  try {
    return await withSchemaEngine({ url }, async (engine) => {
      const { appliedMigrationNames } = await engine.applyMigrations({
        migrationsList: readMigrations(folder),
        filters: { externalTables: [], externalEnums: [] },
      })
      return appliedMigrationNames
    })
  } catch (error) {
    const reason = error instanceof Error ? error.message.trim().replaceAll(/\s+/g, ' ') : String(error)
    throw new Failure(
      `The database could not be brought to this version (${reason}): nothing of the failing step was kept; restore a backup or report this message.`,
      error,
    )
  }
}
