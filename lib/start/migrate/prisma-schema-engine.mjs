#!/usr/bin/env node
// @ts-check
// Answers Prisma's command line in the place of its native schema engine: JSON-RPC, one message a line.
import fs from 'node:fs'
import readline from 'node:readline'
import { parseArgs } from 'node:util'
import { withSchemaEngine } from './engine.mjs'
import { runDatabaseCommand } from './engine-database-command.mjs'
import { answer } from './engine-methods.mjs'

const { values, positionals } = parseArgs({
  args: process.argv.slice(2),
  strict: false,
  allowPositionals: true,
  options: {
    datamodels: { type: 'string', multiple: true },
    datasource: { type: 'string' },
    version: { type: 'boolean' },
  },
})
const url = typeof values.datasource === 'string' ? String(JSON.parse(values.datasource).url) : ''
/** @type {[string, string][]} */
const schemas = (values.datamodels ?? []).map((file) => [String(file), fs.readFileSync(String(file), 'utf8')])

/** @param {unknown} message */
const send = (message) =>
  process.stdout.write(`${JSON.stringify({ jsonrpc: '2.0', .../** @type {object} */ (message) })}\n`)

async function serve() {
  const on = schemas.length > 0 ? { url, schemas } : { url }
  await withSchemaEngine(on, async (engine) => {
    for await (const line of readline.createInterface({ input: process.stdin })) {
      if (line.trim() === '') continue
      const { id, method, params } = JSON.parse(line)
      // a message without a method is the command line's reply to a `print` of ours
      if (!method) continue
      try {
        send({
          id,
          result: await answer(engine, method, params ?? {}, (content) =>
            send({ id: 1e6 + id, method: 'print', params: { content } }),
          ),
        })
      } catch (error) {
        const {
          message = String(error),
          code = null,
          meta = null,
        } = /** @type {{ message?: string, code?: string, meta?: unknown }} */ (error)
        send({ id, error: { code: 4466, message, data: { is_panic: false, message, error_code: code, meta } } })
      }
    }
  })
}

if (values.version) process.stdout.write('schema-engine-cli (WebAssembly)\n')
else if (positionals[0] === 'cli') process.exitCode = await runDatabaseCommand(String(positionals[1]), url)
else await serve()
process.exit()
