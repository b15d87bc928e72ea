import 'server-only'
import { DomainError } from '@/lib/errors'
import type { Actor } from '@/lib/server/actor'
import { currentActor } from '@/lib/server/session'
import type { Outcome } from './outcome'

/** Runs what an action is there for; a refusal comes back as a value, an ended session as one of them, a bug is thrown. */
export const attempt = async <T>(run: (actor: Actor) => Promise<T>): Promise<Outcome<T>> => {
  try {
    const actor = await currentActor()
    if (!actor) throw new DomainError('not-signed-in', 'Your session has ended: sign in again, then repeat this.')
    return { ok: true, value: await run(actor) }
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    const { code, message, issues, detail } = error
    return { ok: false, code, message, issues, detail: detail ?? null }
  }
}
