// @ts-check
import { PrismaPg } from '@prisma/adapter-pg'
import { ColumnTypeEnum } from '@prisma/driver-adapter-utils'
import pg from 'pg'

/** @typedef {import('@prisma/driver-adapter-utils').SqlDriverAdapter} SqlDriverAdapter */

/** The catalogue's one-byte type `"char"`, which the adapter does not know, and the type it is handed over as. */
const internalChar = 18
const text = 25

/**
 * Hands columns of the internal type over as text and tells which ones they were in the last answer.
 * @param {pg.Pool} pool
 * @param {Set<number>} relabelled
 */
function relabelInternalChars(pool, relabelled) {
  const query = pool.query.bind(pool)
  /** @param {Parameters<typeof query>} question */
  const relabelling = async (...question) => {
    const answer = await query(...question)
    for (const part of Array.isArray(answer) ? answer : [answer]) {
      for (const [index, field] of (part.fields ?? []).entries()) {
        if (field.dataTypeID !== internalChar) continue
        field.dataTypeID = text
        relabelled.add(index)
      }
    }
    return answer
  }
  Object.assign(pool, { query: relabelling })
}

/**
 * A connection for the schema engine, with three corrections to the adapter: the catalogue's `"char"` columns are read,
 * a script is sent whole (split at semicolons, functions between `$$` would break), and disposing closes the connection,
 * without which the engine's advisory lock would stay.
 * @param {string} url
 * @param {Set<pg.Pool>} open keeps the pools that are to be closed
 * @param {() => Promise<void>} [afterwards]
 * @returns {Promise<SqlDriverAdapter>}
 */
export async function connectEngine(url, open, afterwards) {
  // one connection: the advisory lock belongs to it and the scripts run in it
  const pool = new pg.Pool({ connectionString: url, max: 1, options: '-c timezone=UTC' })
  open.add(pool)
  const wholeScript = pool.query.bind(pool)
  /** @type {Set<number>} */
  const relabelled = new Set()
  relabelInternalChars(pool, relabelled)
  const adapter = await new PrismaPg(pool).connect()
  const ask = adapter.queryRaw.bind(adapter)
  return Object.assign(adapter, {
    /** @param {import('@prisma/driver-adapter-utils').SqlQuery} query */
    queryRaw: async (query) => {
      relabelled.clear()
      const answer = await ask(query)
      const columnTypes = answer.columnTypes.map((type, index) =>
        relabelled.has(index) ? ColumnTypeEnum.Character : type,
      )
      return { ...answer, columnTypes }
    },
    /** @param {string} sql */
    executeScript: async (sql) => {
      try {
        await wholeScript(sql)
      } catch (error) {
        // the adapter's own translation of database errors, which it keeps to itself
        Reflect.get(adapter, 'onError').call(adapter, error)
      }
    },
    dispose: async () => {
      open.delete(pool)
      await pool.end()
      await afterwards?.()
    },
  })
}
