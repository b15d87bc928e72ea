'use server'

import { attempt } from '@/app/_action/attempt'
import { registerCertificate } from '@/lib/server/people/commands'
import { perform } from '@/lib/server/perform'

interface Answer {
  readonly spki: string
  readonly challenge: string
  readonly proof: string
}

export async function registerSigningKey(organisationId: string, answer: Answer) {
  return attempt((actor) => perform(registerCertificate, actor, { organisationId, ...answer }))
}
