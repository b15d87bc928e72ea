// @ts-check
import { startCluster } from '../embedded/server.mjs'
import { isAlive } from '../process-identity.mjs'

/** @typedef {import('../embedded/server.mjs').Cluster} Cluster */

/**
 * Starts the embedded server again, at the same port, when it has died; the pools of the other processes find it by themselves.
 * @param {Cluster} first
 * @param {(line: string) => void} say
 * @returns {{ stop: () => Promise<void> }}
 */
export function guardCluster(first, say) {
  let cluster = first
  let stopped = false
  /** @type {Promise<void>} */
  let restarting = Promise.resolve()
  const restart = async () => {
    say('The embedded database ended and is started again')
    try {
      cluster = await startCluster({ dataDir: first.dataDir })
    } catch (error) {
      say(`${error instanceof Error ? error.message : error} It is tried again.`)
    }
  }
  let busy = false
  const watch = setInterval(() => {
    if (stopped || busy || isAlive(cluster.pid)) return
    busy = true
    restarting = restart().finally(() => {
      busy = false
    })
  }, 1000)
  return {
    stop: async () => {
      stopped = true
      clearInterval(watch)
      await restarting
      await cluster.stop()
    },
  }
}
