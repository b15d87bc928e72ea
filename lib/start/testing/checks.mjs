// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { inRoot } from '../root.mjs'
import { lastLines, runNode } from '../run-step.mjs'
import { toolPath } from '../tools.mjs'

/** @typedef {import('./stages.mjs').Counts} Counts */

/**
 * One tool, one check: passed when it ends with 0 and, where given, says the words.
 * @param {string[]} args of Node
 * @param {{ env?: Record<string, string | undefined>, words?: string }} [how]
 * @returns {Promise<Counts>}
 */
export async function checkWith(args, { env = {}, words } = {}) {
  const outcome = await runNode(args, env)
  const said = words === undefined || outcome.stdout.includes(words)
  if (outcome.status === 0 && said) return { passed: 1, failed: 0 }
  return { passed: 0, failed: 1, note: lastLines(outcome, 80) }
}

/** Types of routes first: the compiler reads them. @returns {Promise<Counts>} */
export async function checkTypes() {
  const routes = await checkWith([toolPath('next'), 'typegen'])
  return routes.failed > 0 ? routes : checkWith([toolPath('tsc'), '--noEmit', '--incremental', 'false'])
}

export const checkStyle = () =>
  checkWith([toolPath('biome'), 'check', '--error-on-warnings', `--config-path=${inRoot()}`])

export const checkUnused = () => checkWith([toolPath('knip'), '--config', '.config/knip.json'])

/**
 * The migrations make exactly the schema. The exit status alone does not tell: the words must be there.
 * @param {string} databaseUrl whose role may make the shadow database
 */
export const checkDrift = (databaseUrl) =>
  checkWith(
    [
      toolPath('prisma'),
      'migrate',
      'diff',
      '--config=.config/prisma.ts',
      '--from-migrations=prisma/migrations',
      '--to-schema=prisma/schema',
      '--exit-code',
    ],
    { env: { DATABASE_URL: databaseUrl }, words: 'No difference detected' },
  )

/**
 * @param {string} name of the report
 * @returns {string} absolute path where no earlier report lies
 */
export function freshReport(name) {
  const file = inRoot('.data', 'test', name)
  fs.mkdirSync(path.dirname(file), { recursive: true })
  fs.rmSync(file, { force: true })
  return file
}
