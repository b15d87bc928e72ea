'use server'

import { attempt, attemptByLink } from '@/app/_action/attempt'
import { acceptInvitation, joinProject } from '@/lib/server/people/join'
import { perform } from '@/lib/server/perform'

export async function accept(token: string) {
  return attempt((actor) => perform(acceptInvitation, actor, { token }))
}

export async function join(token: string, password: string) {
  return attemptByLink(() => joinProject(token, password))
}
