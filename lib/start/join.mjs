// @ts-check
import { readEnvironment } from './environment.mjs'
import { Failure } from './failure.mjs'
import { preparePrograms } from './prepare.mjs'
import { programEnvironment } from './program-environment.mjs'
import { ensureSecrets } from './secrets.mjs'

/**
 * Makes this process one of several on a shared database: prepares the programs, brings the database to this version and
 * puts into the environment what the program expects there.
 * @param {string} command named in the sentence when there is no database
 * @param {(line: string) => void} say
 * @returns {Promise<import('./environment.mjs').Environment>}
 */
export async function joinDatabase(command, say) {
  const environment = readEnvironment()
  if (environment.databaseUrl === null) {
    throw new Failure(
      `"${command}" needs a database shared with the other processes: set DATABASE_URL, or use "npm start" for everything on this machine.`,
    )
  }
  await preparePrograms(say)
  const secrets = ensureSecrets(environment.secretsDir)
  Object.assign(process.env, programEnvironment({ databaseUrl: environment.databaseUrl, secrets }))
  const { bringUpToDate } = await import('./database.mjs')
  await bringUpToDate(environment.databaseUrl)
  return environment
}
