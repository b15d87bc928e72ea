// @ts-check
// One web process on the database in DATABASE_URL; start as many as wanted, each with a port of its own.
import './node-version.mjs'
import { pathToFileURL } from 'node:url'
import { runCommand } from './failure.mjs'
import { joinDatabase } from './join.mjs'
import { openPort } from './port.mjs'
import { prepareApplication } from './prepare.mjs'

/** @param {string} line */
const say = (line) => process.stdout.write(`${line}\n`)

await runCommand(async () => {
  const { host, port: wanted } = await joinDatabase('npm run web', say)
  const server = await prepareApplication(say)
  await openPort({ wanted, host }, async (port) => {
    Object.assign(process.env, { HOSTNAME: host, PORT: String(port) })
    process.env.BASE_URL ||= `http://${host}:${port}`
    say(`Web process ${process.pid} on http://${host}:${port}`)
    await import(pathToFileURL(server).href)
  })
})
