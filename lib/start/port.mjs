// @ts-check
import net from 'node:net'
import { Failure } from './failure.mjs'
import { withLock } from './lock.mjs'
import { pause } from './pause.mjs'
import { inRoot } from './root.mjs'

/**
 * @param {number} port 0 = any
 * @param {string} host
 * @returns {Promise<number | null>} the port, or null when it cannot be bound
 */
export function tryPort(port, host) {
  return new Promise((resolve) => {
    const server = net.createServer()
    server.once('error', () => resolve(null))
    server.listen({ port, host, exclusive: true }, () => {
      const address = /** @type {net.AddressInfo} */ (server.address())
      server.close(() => resolve(address.port))
    })
  })
}

/** @param {string} [host] @returns {Promise<number>} any free port */
export async function anyFreePort(host = '127.0.0.1') {
  const port = await tryPort(0, host)
  if (port === null) throw new Failure(`No port can be opened on ${host}: set HOST to an address of this machine.`)
  return port
}

/**
 * The port to serve on: the one asked for or nothing, else the first free one from 3000 on.
 * @param {{ wanted?: string | undefined, host: string, first?: number, tries?: number }} choice
 * @returns {Promise<number>}
 */
export async function choosePort({ wanted, host, first = 3000, tries = 100 }) {
  if (wanted !== undefined && wanted !== '') {
    const port = Number(wanted)
    if (!Number.isInteger(port) || port < 1 || port > 65535) {
      throw new Failure(`PORT is "${wanted}": set it to a whole number from 1 to 65535.`)
    }
    if ((await tryPort(port, host)) === null) {
      throw new Failure(`Port ${port} on ${host} is taken or not permitted: set PORT to another one.`)
    }
    return port
  }
  for (let port = first; port < first + tries; port += 1) {
    if ((await tryPort(port, host)) !== null) return port
  }
  throw new Failure(`No free port from ${first} to ${first + tries - 1} on ${host}: set PORT to a free one.`)
}

/**
 * Chooses a port and has it opened before any other command of this project chooses one.
 * @param {Parameters<typeof choosePort>[0]} choice
 * @param {(port: number) => Promise<void>} open begins to listen; it may take up to a minute
 * @returns {Promise<number>}
 */
export const openPort = (choice, open) =>
  withLock(inRoot('.data', 'port.lock'), async () => {
    const port = await choosePort(choice)
    await open(port)
    const until = Date.now() + 60_000
    while ((await tryPort(port, choice.host)) !== null && Date.now() < until) await pause(50)
    return port
  })
