// @ts-check
import { pause } from '../pause.mjs'

/**
 * @param {string} address of the application
 * @returns {Promise<boolean>} whether it answers and says that it is well
 */
async function isHealthy(address) {
  try {
    const answer = await fetch(new URL('/api/health', address), { signal: AbortSignal.timeout(5000) })
    await answer.arrayBuffer()
    return answer.ok
  } catch {
    return false
  }
}

/**
 * @param {string} address
 * @param {{ seconds: number, givenUp?: () => boolean }} limits `givenUp` tells that waiting longer is useless
 * @returns {Promise<boolean>} whether it became healthy in time
 */
export async function waitForHealth(address, { seconds, givenUp = () => false }) {
  const until = Date.now() + seconds * 1000
  while (Date.now() < until && !givenUp()) {
    if (await isHealthy(address)) return true
    await pause(60)
  }
  return false
}
