import { type ChainedEvent, chainStart, eventHash } from './audit'

/**
 * Where a chain of events breaks: the first sequence that does not follow from what stands before it, the one after the
 * last where the head names another; null if it holds.
 */
export function chainBreak(
  events: readonly (ChainedEvent & { hash: string })[],
  head: { sequence: number; auditHash: string },
): number | null {
  let previousHash = chainStart
  for (const [index, event] of events.entries()) {
    const follows = event.sequence === index + 1 && event.previousHash === previousHash
    if (!follows || event.hash !== eventHash(event)) return index + 1
    previousHash = event.hash
  }
  return head.sequence === events.length && head.auditHash === previousHash ? null : events.length + 1
}
