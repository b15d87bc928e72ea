// @ts-check
/** @typedef {import('@prisma/schema-engine-wasm/schema_engine_bg').SchemaEngine} SchemaEngine */

/** These two read the engine's picture of the migrations only, which the diagnosis fills through a shadow database. */
const needDiagnosis = new Set(['evaluateDataLoss', 'createMigration'])

/**
 * Carries out one method of the command line's protocol.
 * @param {SchemaEngine} engine
 * @param {string} method
 * @param {any} params as the command line sends them
 * @param {(content: string) => void} print
 * @returns {Promise<unknown>}
 */
export async function answer(engine, method, params, print) {
  if (needDiagnosis.has(method)) {
    await engine.devDiagnostic({ migrationsList: params.migrationsList, filters: params.filters })
  }
  if (method === 'getDatabaseVersion') return (await engine.version()) ?? {}
  if (method === 'diff') {
    const { exitCode, stdout } = await engine.diff(params)
    if (stdout !== null && stdout !== undefined) print(stdout)
    return { exitCode, stdout: null }
  }
  const work = Reflect.get(engine, method)
  if (typeof work !== 'function') throw new Error(`The schema engine has no method ${method}.`)
  return (await work.call(engine, params)) ?? {}
}
