// @ts-check
import crypto from 'node:crypto'
import { seedDemo } from '../demo.mjs'
import { prepareApplication, preparePrograms } from '../prepare.mjs'
import { programEnvironment } from '../program-environment.mjs'
import { inRoot } from '../root.mjs'
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
  const secret = () => crypto.randomBytes(32).toString('base64url')
  const secrets = { BETTER_AUTH_SECRET: secret(), CA_WRAP_SECRET: secret() }
  const env = { ...process.env, ...programEnvironment({ databaseUrl: database.url, secrets }), BASE_URL: address }
  await seedDemo(database.url, peopleFile, env)
  await startService({ web: [server], address, host, port, env, logDir: inRoot('.data', 'test', 'log'), say, undo })
  return address
}
