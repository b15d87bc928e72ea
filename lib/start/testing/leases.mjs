// @ts-check
import fs from 'node:fs'
import path from 'node:path'
import { identify, stillRuns } from '../process-identity.mjs'

/**
 * Who uses the test cluster. Several test runs share one server; the last one to leave stops it.
 * @param {string} folder
 */
export function leasesIn(folder) {
  const own = path.join(folder, `${process.pid}.json`)
  return {
    take() {
      fs.mkdirSync(folder, { recursive: true })
      fs.writeFileSync(own, JSON.stringify(identify(process.pid)))
    },
    /** Gives the own lease back and clears those of ended processes. @returns {boolean} whether nobody is left */
    leave() {
      fs.rmSync(own, { force: true })
      const names = fs.existsSync(folder) ? fs.readdirSync(folder) : []
      const living = names.filter((name) => {
        try {
          if (stillRuns(JSON.parse(fs.readFileSync(path.join(folder, name), 'utf8')))) return true
        } catch {
          // half written by a process that was killed
        }
        fs.rmSync(path.join(folder, name), { force: true })
        return false
      })
      return living.length === 0
    },
  }
}
