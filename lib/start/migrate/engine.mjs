// @ts-check
import crypto from 'node:crypto'
import fs from 'node:fs'
import { createRequire } from 'node:module'
import path from 'node:path'
import { bindMigrationAwareSqlAdapterFactory } from '@prisma/driver-adapter-utils'
import * as bindings from '@prisma/schema-engine-wasm/schema_engine_bg'
import { withClient } from '../embedded/owner.mjs'
import { connectEngine } from './connection.mjs'

let loaded = false

/** Loads the engine's code once a process. */
function load() {
  if (loaded) return
  // the engine reports a panic to this object before it stops; without it the reason is lost
  Object.assign(globalThis, {
    PRISMA_WASM_PANIC_REGISTRY: {
      /** @param {string} message */
      set_message: (message) => process.stderr.write(`${message}\n`),
    },
  })
  const folder = path.dirname(createRequire(import.meta.url).resolve('@prisma/schema-engine-wasm/schema_engine_bg'))
  const code = new WebAssembly.Module(fs.readFileSync(path.join(folder, 'schema_engine_bg.wasm')))
  const instance = new WebAssembly.Instance(code, { './schema_engine_bg.js': bindings })
  bindings.__wbg_set_wasm(instance.exports)
  const begin = instance.exports.__wbindgen_start
  if (typeof begin === 'function') begin()
  loaded = true
}

/**
 * Runs `work` with Prisma's own schema engine (its WebAssembly build, so that no program is downloaded) on a database.
 * @template T
 * @param {{ url: string, schemas?: [string, string][] }} on `schemas`: file names with their Prisma schema text
 * @param {(engine: bindings.SchemaEngine) => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function withSchemaEngine({ url, schemas }, work) {
  load()
  /** @type {Set<import('pg').Pool>} */
  const open = new Set()
  const connectToShadowDb = async () => {
    const name = `shadow_${crypto.randomUUID().replaceAll('-', '')}`
    await withClient(url, (client) => client.query(`create database ${name}`))
    const shadow = new URL(url)
    shadow.pathname = `/${name}`
    return connectEngine(shadow.href, open, async () => {
      await withClient(url, (client) => client.query(`drop database ${name} with (force)`))
    })
  }
  const factory = bindMigrationAwareSqlAdapterFactory({
    provider: 'postgres',
    adapterName: 'pg',
    connect: () => connectEngine(url, open),
    connectToShadowDb,
  })
  const engine = await bindings.SchemaEngine.new({ datamodels: schemas }, () => {}, factory)
  try {
    return await work(engine)
  } finally {
    // freeing the engine leaves its connection, and with it the advisory lock
    engine.free()
    await Promise.all([...open].map((pool) => pool.end()))
  }
}
