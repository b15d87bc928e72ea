// @ts-check
// One worker process on the database in DATABASE_URL; start as many as wanted.
import './node-version.mjs'
import { pathToFileURL } from 'node:url'
import { bundleOf } from './entries.mjs'
import { runCommand } from './failure.mjs'
import { joinDatabase } from './join.mjs'

/** @param {string} line */
const say = (line) => process.stdout.write(`${line}\n`)

await runCommand(async () => {
  await joinDatabase('npm run worker', say)
  say(`Worker process ${process.pid}`)
  await import(pathToFileURL(bundleOf('worker')).href)
})
