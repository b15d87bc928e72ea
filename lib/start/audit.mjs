// @ts-check
// Follows the chains of events in the database of DATABASE_URL, or in the one that "npm start" keeps while it runs.
import './node-version.mjs'
import { pathToFileURL } from 'node:url'
import { bundleOf } from './entries.mjs'
import { runCommand } from './failure.mjs'
import { joinDatabase } from './join.mjs'

await runCommand(async () => {
  await joinDatabase('npm run audit', (line) => process.stderr.write(`${line}\n`))
  await import(pathToFileURL(bundleOf('audit')).href)
})
