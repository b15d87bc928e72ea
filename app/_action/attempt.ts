import 'server-only'
import { DomainError } from '@/lib/errors'
import type { Actor } from '@/lib/server/actor'
import { currentActor } from '@/lib/server/session'
import type { Outcome } from './outcome'

/** Runs what an action is there for; a refusal comes back as a value, an ended session as one of them, a bug is thrown. */
export const attempt = <T>(run: (actor: Actor) => Promise<T>): Promise<Outcome<T>> =>
  attemptByLink(async () => {
    const actor = await currentActor()
    if (!actor) throw new DomainError('not-signed-in', 'Your session has ended: sign in again, then repeat this.')
    return run(actor)
  })

/** The same for whoever holds a link and need not be signed in. */
export const attemptByLink = async <T>(run: () => Promise<T>): Promise<Outcome<T>> => {
  try {
    return { ok: true, value: await run() }
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    const { code, message, issues, detail } = error
    return { ok: false, code, message, issues, detail: detail ?? null }
  }
}
