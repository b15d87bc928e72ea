// @ts-check
import crypto from 'node:crypto'
import { seedDemo } from '../demo.mjs'
import { prepareApplication, preparePrograms } from '../prepare.mjs'
import { inRoot } from '../root.mjs'
import { secretNames } from '../secrets.mjs'
import { startService } from '../service/service.mjs'
import { joinTestCluster, leaveTestCluster } from './cluster.mjs'
import { copyTemplate, ensureTemplate } from './template.mjs'

/**
 * Serves the application on a new database with the demo plant; all of it is gone once `undo` has run.
 * @param {object} how
 * @param {number} how.port
 * @param {string} how.peopleFile where the seed writes how its people sign in
 * @param {(line: string) => void} how.say
 * @param {ReturnType<import('../undo-list.mjs').undoList>} how.undo
 * @returns {Promise<string>} the address, once it answers
 */
export async function serveFresh({ port, peopleFile, say, undo }) {
  await preparePrograms(say)
  const server = await prepareApplication(say)
  const cluster = await joinTestCluster()
  undo.add(() => leaveTestCluster(cluster))
  const url = cluster.ownerUrl('postgres')
  const database = await copyTemplate(url, await ensureTemplate(url))
  undo.add(database.drop)
  const host = '127.0.0.1'
  const address = `http://${host}:${port}`
  const env = {
    ...process.env,
    ...Object.fromEntries(secretNames.map((name) => [name, crypto.randomBytes(32).toString('base64url')])),
    DATABASE_URL: database.url,
    BASE_URL: address,
    NODE_ENV: 'production',
    NEXT_TELEMETRY_DISABLED: '1',
  }
  await seedDemo(database.url, peopleFile, env)
  await startService({ web: [server], address, host, port, env, logDir: inRoot('.data', 'test', 'log'), say, undo })
  return address
}
