// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import pg from 'pg'
import { pause } from '../pause.mjs'
import { isAlive } from '../process-identity.mjs'

/**
 * What the server wrote about itself while it runs.
 * @param {string} dataDir
 * @returns {{ pid: number, port: number } | null}
 */
export function readPostmaster(dataDir) {
  try {
    const lines = fs.readFileSync(path.join(dataDir, 'postmaster.pid'), 'utf8').split('\n')
    const pid = Number(lines[0])
    const port = Number(lines[3])
    return pid > 0 && port > 0 ? { pid, port } : null
  } catch {
    return null
  }
}

/**
 * @param {string} url of the superuser
 * @param {string} dataDir
 * @returns {Promise<boolean>} whether the server behind the address accepts us and serves this very cluster
 */
export async function serves(url, dataDir) {
  const client = new pg.Client({ connectionString: url, connectionTimeoutMillis: 2000 })
  client.on('error', () => {})
  try {
    await client.connect()
    const { rows } = await client.query('show data_directory')
    return fs.realpathSync(rows[0].data_directory) === fs.realpathSync(dataDir)
  } catch {
    return false
  } finally {
    await client.end().catch(() => {})
  }
}

/**
 * Ends the server: first as a planned stop (sessions are cut off, everything is written), after 30 s at once (the next
 * start then recovers from the log; nothing committed is lost).
 * @param {number} pid
 */
export async function stopPostmaster(pid) {
  for (const [signal, patience] of /** @type {[NodeJS.Signals, number][]} */ ([
    ['SIGINT', 30_000],
    ['SIGQUIT', 10_000],
  ])) {
    try {
      process.kill(pid, signal)
    } catch {
      return
    }
    const until = Date.now() + patience
    while (isAlive(pid) && Date.now() < until) await pause(20)
    if (!isAlive(pid)) return
  }
}
