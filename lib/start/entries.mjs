// @ts-check
import fs from 'node:fs'
import { inRoot } from './root.mjs'

/**
 * Every program that runs under Node outside the framework: the name of its bundle in `.jobs` and its source.
 * @type {Record<string, string>}
 */
export const entries = {
  worker: 'lib/server/jobs/main.ts',
  render: 'lib/compute/render.worker.ts',
  compute: 'lib/compute/node.worker.ts',
  verify: 'lib/seal/verify.worker.ts',
  study: 'lib/cli/main.ts',
  bench: 'lib/cli/bench.ts',
  seed: 'prisma/seed.ts',
  audit: 'lib/server/console/audit/main.ts',
  queues: 'lib/server/console/install-queues.ts',
}

/** @param {string} name @returns {string} absolute path of the bundle */
export const bundleOf = (name) => inRoot('.jobs', `${name}.js`)

/** @returns {{ present: Record<string, string>, missing: string[] }} the entries by whether their source exists */
export function sortEntries() {
  const all = Object.entries(entries)
  const exists = (/** @type {string} */ source) => fs.existsSync(inRoot(source))
  return {
    present: Object.fromEntries(
      all.filter(([, source]) => exists(source)).map(([name, source]) => [name, inRoot(source)]),
    ),
    missing: all.filter(([, source]) => !exists(source)).map(([, source]) => source),
  }
}
