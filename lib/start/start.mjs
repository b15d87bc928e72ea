// @ts-check
import './node-version.mjs'
import fs from 'node:fs'
import path from 'node:path'
import { isLoopback, readEnvironment } from './environment.mjs'
import { runCommand } from './failure.mjs'
import { openPort } from './port.mjs'
import { prepareApplication, preparePrograms } from './prepare.mjs'
import { programEnvironment } from './program-environment.mjs'
import { demoPeopleFile, ensureSecrets } from './secrets.mjs'
import { claimRun } from './service/run-record.mjs'
import { runUntilStopped } from './undo-list.mjs'

const began = performance.now()
const development = process.argv.includes('--dev')

/** @param {string} line */
const say = (line) => process.stdout.write(`${line}\n`)

/** @param {string} host @param {number} port @returns {string} how this machine reaches it */
function ownAddress(host, port) {
  const name = host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host
  return `http://${name.includes(':') ? `[${name}]` : name}:${port}`
}

/**
 * The database to use: the one given, or the embedded one, started and stopped with us.
 * @param {import('./environment.mjs').Environment} environment
 * @param {ReturnType<import('./undo-list.mjs').undoList>} undo
 */
async function openDatabase({ databaseUrl, dataDir }, undo) {
  // loaded late: these need installed packages
  const { bringUpToDate, startEmbedded } = await import('./database.mjs')
  const { guardCluster } = await import('./service/guard-cluster.mjs')
  let url = databaseUrl
  if (url === null) {
    const embedded = await startEmbedded(dataDir)
    undo.add(guardCluster(embedded.cluster, say).stop)
    url = embedded.url
  }
  const applied = await bringUpToDate(url)
  if (applied.length > 0) say(`Database brought to this version (${applied.length} migrations)`)
  return url
}

/** @param {ReturnType<import('./undo-list.mjs').undoList>} undo */
async function start(undo) {
  const environment = readEnvironment()
  const { host, dataDir, secretsDir } = environment
  const run = await claimRun(dataDir)
  undo.add(async () => run.release())
  if (run.leftovers > 0) say(`Ended ${run.leftovers} processes that an earlier start had left behind`)
  await preparePrograms(say)
  const secrets = ensureSecrets(secretsDir)
  const databaseUrl = await openDatabase(environment, undo)
  const env = { ...process.env, ...programEnvironment({ databaseUrl, secrets, development }) }
  const { peopleTable, readDemoPeople, seedDemo } = await import('./demo.mjs')
  const demo = environment.databaseUrl === null && isLoopback(host)
  // lies beside the database it tells about, so that both go together
  const seeded = path.join(dataDir, 'pg.seeded')
  if (demo && !fs.existsSync(seeded)) {
    await seedDemo(databaseUrl, demoPeopleFile(secretsDir), env)
    fs.writeFileSync(seeded, '')
  }
  if (!demo && environment.databaseUrl === null)
    say('No demo people are made where other machines can reach the application (HOST)')
  const server = development ? null : await prepareApplication(say)
  const { startService } = await import('./service/service.mjs')
  const { toolPath } = await import('./tools.mjs')
  let address = ''
  let restartWorker = async () => {}
  await openPort({ wanted: environment.port, host }, async (port) => {
    address = ownAddress(host, port)
    const service = await startService({
      web: server ? [server] : [toolPath('next'), 'dev', '-p', String(port), '-H', host],
      address,
      host,
      port,
      env: { ...env, BASE_URL: process.env.BASE_URL || address },
      logDir: path.join(dataDir, 'log'),
      say,
      undo,
      onProcesses: (pids) => run.update(address, pids),
    })
    restartWorker = service.restartWorker
  })
  if (development) {
    const { watchBundles } = await import('./watch-bundles.mjs')
    undo.add(await watchBundles(say, restartWorker))
  }
  const people = demo ? readDemoPeople(demoPeopleFile(secretsDir)) : []
  say(`\nBreakaway is ready at ${address} after ${((performance.now() - began) / 1000).toFixed(1)} s`)
  if (people.length > 0)
    say(
      `\nDemo people\n${peopleTable(people)
        .map((line) => `  ${line}`)
        .join('\n')}`,
    )
  say(`\nData in ${dataDir}, logs in ${path.join(dataDir, 'log')}, secrets in ${secretsDir}. Stop with Ctrl+C.`)
  await new Promise(() => {})
}

await runCommand(() => runUntilStopped(say, start))
