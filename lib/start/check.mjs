// @ts-check
// The checks that need no database, in seconds: types, style and import rules, unused code.
import './node-version.mjs'
import { runCommand } from './failure.mjs'
import { preparePrograms } from './prepare.mjs'

/** @param {string} line */
const say = (line) => process.stdout.write(`${line}\n`)

await runCommand(async () => {
  await preparePrograms(say)
  const { stages } = await import('./testing/stages.mjs')
  const { checkStyle, checkTypes, checkUnused } = await import('./testing/checks.mjs')
  const parts = stages(say)
  await parts.run('types', checkTypes)
  await parts.run('style and import rules', checkStyle)
  await parts.run('unused code and packages', checkUnused)
  process.exitCode = parts.total().failed === 0 ? 0 : 1
})
