import type { PolicyActor } from '@/lib/policy/role'
import type { Actor } from './actor'
import type { Tx } from './db'
import type { Place } from './place'

/** What a query may use. */
export interface ReadContext {
  tx: Tx
  actor: Actor
  place: Place
  policy: PolicyActor
  /** The instant of the transaction. */
  at: Date
}

/** What a command may use: the same, under the lock of the head row. */
export type WriteContext = ReadContext
