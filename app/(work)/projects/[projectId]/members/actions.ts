'use server'

import { attempt } from '@/app/_action/attempt'
import { linkTo } from '@/lib/server/link-token'
import { inviteMember, withdrawInvitation } from '@/lib/server/people/invite'
import { changeMember } from '@/lib/server/people/member-commands'
import { perform } from '@/lib/server/perform'

type Invited = Omit<Parameters<typeof inviteMember.run>[1], 'projectId' | 'lastDay'> & { lastDay: string | null }
type Changed = Pick<Parameters<typeof changeMember.run>[1], 'roles'> & { lastDay: string | null }

export async function invite(projectId: string, invited: Invited) {
  return attempt(async (actor) => {
    const { token, expiresAt } = await perform(inviteMember, actor, { ...invited, projectId })
    return { link: linkTo('join', token), expiresAt }
  })
}

export async function withdraw(projectId: string, invitationId: string) {
  return attempt((actor) => perform(withdrawInvitation, actor, { projectId, invitationId }))
}

export async function change(projectId: string, userId: string, changed: Changed) {
  return attempt((actor) => perform(changeMember, actor, { ...changed, projectId, userId }))
}
