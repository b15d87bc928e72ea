// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { Failure } from '../failure.mjs'
import { withLock } from '../lock.mjs'
import { pause } from '../pause.mjs'
import { identify, stillRuns } from '../process-identity.mjs'

/** @typedef {import('../process-identity.mjs').ProcessIdentity} ProcessIdentity */
/**
 * @typedef {object} RunRecord what runs on a data folder
 * @property {ProcessIdentity} launcher
 * @property {string | null} address
 * @property {ProcessIdentity[]} children
 */

/** @param {string} dataDir @returns {string} */
const recordFile = (dataDir) => path.join(dataDir, 'run.json')

/** @param {string} dataDir @returns {RunRecord | null} */
function readRecord(dataDir) {
  try {
    return JSON.parse(fs.readFileSync(recordFile(dataDir), 'utf8'))
  } catch {
    return null
  }
}

/** @param {string} dataDir @param {RunRecord} record */
function writeRecord(dataDir, record) {
  const unfinished = `${recordFile(dataDir)}.${process.pid}`
  fs.writeFileSync(unfinished, JSON.stringify(record), { mode: 0o600 })
  fs.renameSync(unfinished, recordFile(dataDir))
}

/**
 * Ends processes that a killed launcher left behind. Where the system does not tell when a process began, the number may
 * belong to anybody by now, and it is left alone.
 * @param {ProcessIdentity[]} processes
 * @param {number} [patience] milliseconds before they are killed
 * @returns {Promise<number>} how many were ended
 */
export async function endLeftovers(processes, patience = 10_000) {
  const ours = processes.filter((one) => one.began !== null && stillRuns(one))
  for (const one of ours) process.kill(one.pid, 'SIGTERM')
  const until = Date.now() + patience
  while (ours.some(stillRuns) && Date.now() < until) await pause(50)
  for (const one of ours.filter(stillRuns)) process.kill(one.pid, 'SIGKILL')
  return ours.length
}

/**
 * Makes this process the one launcher of a data folder and ends what an earlier, killed one left running.
 * @param {string} dataDir
 * @returns {Promise<{ leftovers: number, update: (address: string | null, pids: (number | undefined)[]) => void, release: () => void }>}
 */
export function claimRun(dataDir) {
  return withLock(path.join(dataDir, 'run.lock'), async () => {
    const earlier = readRecord(dataDir)
    if (earlier && earlier.launcher.pid !== process.pid && stillRuns(earlier.launcher)) {
      const where = earlier.address ? ` at ${earlier.address}` : ''
      throw new Failure(
        `Breakaway already runs on this data folder${where} (process ${earlier.launcher.pid}): use it, or stop it there with Ctrl+C.`,
      )
    }
    const leftovers = await endLeftovers(earlier?.children ?? [])
    const launcher = identify(process.pid)
    writeRecord(dataDir, { launcher, address: null, children: [] })
    return {
      leftovers,
      update: (address, pids) => {
        const children = pids.filter((pid) => pid !== undefined).map(identify)
        writeRecord(dataDir, { launcher, address, children })
      },
      release: () => fs.rmSync(recordFile(dataDir), { force: true }),
    }
  })
}
