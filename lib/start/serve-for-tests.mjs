// @ts-check
// Serves the application for the browser tests on PORT, on a database of its own that is dropped at the end.
import './node-version.mjs'
import { runCommand } from './failure.mjs'
import { ensurePackages } from './packages.mjs'
import { choosePort } from './port.mjs'
import { inRoot } from './root.mjs'
import { runUntilStopped } from './undo-list.mjs'

/** @param {string} line */
const say = (line) => process.stdout.write(`${line}\n`)

await runCommand(() =>
  runUntilStopped(say, async (undo) => {
    await ensurePackages(say)
    const { serveFresh } = await import('./testing/serve-fresh.mjs')
    const port = await choosePort({ wanted: process.env.PORT, host: '127.0.0.1', first: 4310 })
    const peopleFile = process.env.DEMO_SECRETS_FILE || inRoot('.data', 'test', 'people.json')
    const address = await serveFresh({ port, peopleFile, say, undo })
    say(`ready ${address}`)
    await new Promise(() => {})
  }),
)
