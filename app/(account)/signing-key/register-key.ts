'use server'

import { attempt } from '@/app/_action/attempt'
import { registerCertificate } from '@/lib/server/people/commands'
import { perform } from '@/lib/server/perform'
import type { KeyAnswer } from '../_signing/new-key-form'

/** Has the organisation's authority issue a certificate for the person's new key. */
export async function registerKey(answer: KeyAnswer) {
  return attempt((actor) => perform(registerCertificate, actor, answer))
}
