'use server'

import { attempt } from '@/app/_action/attempt'
import { registerCertificate } from '@/lib/server/people/commands'
import { endSession } from '@/lib/server/people/sessions'
import { perform } from '@/lib/server/perform'
import { sessionHere } from '@/lib/server/session'

interface Answer {
  readonly spki: string
  readonly challenge: string
  readonly proof: string
}

export async function registerSigningKey(organisationId: string, answer: Answer) {
  return attempt((actor) => perform(registerCertificate, actor, { organisationId, ...answer }))
}

/** Ends one session of the signed-in person, or with null every other one. */
export async function endOwnSession(sessionId: string | null) {
  return attempt(async (actor) => endSession(actor, (await sessionHere())?.token ?? '', { sessionId }))
}
