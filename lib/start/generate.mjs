// @ts-check
import { Failure } from './failure.mjs'
import { inRoot } from './root.mjs'
import { lastLines, runNode } from './run-step.mjs'
import { readStamp, stampOf, writeStamp } from './stamp.mjs'
import { toolPath } from './tools.mjs'

/** Writes the database client from the schema unless it is up to date. */
export async function ensureClient() {
  const file = inRoot('prisma', 'generated', '.stamp')
  const stamp = stampOf({ paths: ['prisma/schema', '.config/prisma.ts', 'package-lock.json'] })
  if (readStamp(file) === stamp) return
  const outcome = await runNode([toolPath('prisma'), 'generate', '--config', '.config/prisma.ts'])
  if (outcome.status !== 0) {
    throw new Failure(`${lastLines(outcome)}\nThe database client could not be generated: correct prisma/schema.`)
  }
  writeStamp(file, stamp)
}
