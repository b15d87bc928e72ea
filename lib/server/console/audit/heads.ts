import * as z from 'zod'
import type { Chain } from './chains'

const head = z.object({ organisationId: z.string(), scope: z.string(), events: z.int().min(0), head: z.string() })

/** A chain's head as it is kept outside the database, one a line. */
export type KeptHead = z.output<typeof head>

export const headLine = ({ organisationId, scope, events, head }: Chain): string =>
  JSON.stringify({ organisationId, scope, events, head })

/**
 * Reads a list of heads that was kept earlier.
 * @throws Error that names the first line which is none
 */
export const readHeads = (text: string): KeptHead[] =>
  text
    .split('\n')
    .filter((line) => line.trim() !== '')
    .map((line, index) => {
      try {
        return head.parse(JSON.parse(line))
      } catch {
        throw new Error(`Line ${index + 1} of the kept list is no chain head: give a file that "heads" has written.`)
      }
    })

/** What of a kept list no longer stands: a chain that is gone, or whose event at that place has another hash. */
export const contradictions = (kept: readonly KeptHead[], found: readonly Chain[]): string[] =>
  kept.flatMap(({ organisationId, scope, events, head }) => {
    const chain = found.find((one) => one.organisationId === organisationId && one.scope === scope)
    if (!chain) return [`${scope}: this chain is gone, it had ${events} events`]
    if (events === 0 || chain.hashes[events - 1] === head) return []
    return [`${scope} (${chain.name}): event ${events} is not the one that was kept`]
  })
