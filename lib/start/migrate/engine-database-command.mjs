// @ts-check
import { withClient } from '../embedded/owner.mjs'

/** @param {string} message @param {string} code the command line's own error codes */
function report(message, code) {
  const fields = { message, error_code: code }
  const line = { level: 'ERROR', target: 'schema_engine::logger', timestamp: new Date().toISOString(), fields }
  // the command line skips the first line, where the native engine has none of its messages
  process.stderr.write(`\n${JSON.stringify(line)}\n`)
}

/**
 * Asks for, makes or removes a database on behalf of Prisma's command line.
 * @param {string} command
 * @param {string} url
 * @returns {Promise<number>} exit status
 */
export async function runDatabaseCommand(command, url) {
  const address = new URL(url)
  const database = decodeURIComponent(address.pathname.slice(1))
  try {
    if (command === 'can-connect-to-database') await withClient(url, async () => {})
    else {
      address.pathname = '/postgres'
      const verb = command === 'create-database' ? 'create' : 'drop'
      await withClient(address.href, (client) => client.query(`${verb} database ${client.escapeIdentifier(database)}`))
    }
    return 0
  } catch (error) {
    const { code, message } = /** @type {{ code?: string, message?: string }} */ (error)
    if (code === '3D000') report(`Database \`${database}\` does not exist`, 'P1003')
    else report(message || String(code), 'P1001')
    return 1
  }
}
