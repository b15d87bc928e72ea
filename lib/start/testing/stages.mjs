// @ts-check
import { explain } from '../failure.mjs'

/** @typedef {{ passed: number, failed: number, note?: string }} Counts */

/**
 * Runs the parts of the test command one after the other and adds up what they count. A part that breaks off counts as one failure.
 * @param {(line: string) => void} say
 */
export function stages(say) {
  /** @type {{ name: string, seconds: number, counts: Counts }[]} */
  const done = []
  return {
    /**
     * @param {string} name
     * @param {() => Promise<Counts>} work
     * @returns {Promise<boolean>} whether nothing failed
     */
    async run(name, work) {
      const began = performance.now()
      /** @type {Counts} */
      let counts
      try {
        counts = await work()
      } catch (error) {
        counts = { passed: 0, failed: 1, note: explain(error) }
      }
      const seconds = (performance.now() - began) / 1000
      done.push({ name, seconds, counts })
      say(`${counts.failed === 0 ? 'ok    ' : 'FAILED'} ${name} (${seconds.toFixed(1)} s)`)
      if (counts.note) say(counts.note)
      return counts.failed === 0
    },
    /** @returns {Counts} */
    total() {
      return {
        passed: done.reduce((sum, { counts }) => sum + counts.passed, 0),
        failed: done.reduce((sum, { counts }) => sum + counts.failed, 0),
      }
    },
    /** @returns {string[]} one line a part: seconds and counts */
    summary() {
      return done.map(
        ({ name, seconds, counts }) =>
          `${seconds.toFixed(1).padStart(7)} s  ${name}: ${counts.passed} passed, ${counts.failed} failed`,
      )
    },
  }
}
