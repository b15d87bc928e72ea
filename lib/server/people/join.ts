import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import type { Invitation } from '@/prisma/generated/client'
import { type Actor, linkHolder } from '../actor'
import type { WriteContext } from '../context'
import type { Tx } from '../db'
import { newId } from '../identity'
import { linkDigest, linkToken } from '../link-token'
import { command, type Done, perform } from '../perform'
import { query, read } from '../read'
import { createAccount } from './create-account'
import { newPassword } from './schema'

const byLink = ({ token }: { token: string }) => ({ kind: 'invitation' as const, token })

/** Looked up again under the lock: of two who use a link at once the second finds it used. */
const loadOpen = ({ tx }: { tx: Tx }, { token }: { token: string }) =>
  tx.invitation.findFirst({ where: { tokenHash: linkDigest(token), acceptedAt: null, withdrawnAt: null } })

export interface InvitationView {
  organisation: string
  project: string
  name: string
  email: string
  roles: readonly string[]
  guest: boolean
  invitedBy: string
  expiresAt: string
  partEndsAt: string | null
}

const invitationOf = query({
  input: z.object({ token: linkToken }),
  scope: byLink,
  load: async () => undefined,
  // the link is the permission
  may: () => ({ allowed: true }),
  run: async ({ tx }, { token }): Promise<InvitationView> => {
    const row = await tx.invitation.findFirstOrThrow({
      where: { tokenHash: linkDigest(token) },
      include: { project: { select: { name: true, organisation: { select: { name: true } } } } },
    })
    return {
      organisation: row.project.organisation.name,
      project: row.project.name,
      name: row.name,
      email: row.email,
      roles: row.roles,
      guest: row.guest,
      invitedBy: row.invitedByName,
      expiresAt: row.expiresAt.toISOString(),
      partEndsAt: row.partEndsAt?.toISOString() ?? null,
    }
  },
})

/** What an invitation says to whoever holds its link. */
export const readInvitation = (token: string): Promise<InvitationView> =>
  read(invitationOf, linkHolder('holder of an invitation'), { token })

/** The signed-in person takes the part that they were invited to; somebody else's account does not. */
export const acceptInvitation = command({
  input: z.object({ token: linkToken }),
  scope: byLink,
  load: loadOpen,
  may: () => ({ allowed: true }),
  run: async (context, _input, open) => {
    const { actor } = context
    if (open && open.email !== actor.email.toLowerCase()) {
      throw new DomainError('forbidden', 'This invitation is for another address: sign in with that one to accept it.')
    }
    return takePart(context, open)
  },
})

const joinAsNew = command({
  input: z.object({ token: linkToken, password: newPassword }),
  scope: byLink,
  load: loadOpen,
  may: () => ({ allowed: true }),
  run: async (context, { password }, open) => {
    const { tx, actor, at } = context
    const known = open && (await tx.user.findUnique({ where: { email: open.email }, select: { id: true } }))
    if (known) throw new DomainError('conflict', 'This address has an account already: sign in to accept.')
    const { userId: id, name, email } = actor
    if (open) await createAccount(tx, { id, name, email, password, initialPassword: false }, at)
    return takePart(context, open)
  },
})

/** Makes an account for the address that was invited and takes the part, both or neither; the answer is the address to sign in with. */
export async function joinProject(token: string, password: string): Promise<{ email: string }> {
  const { name, email } = await readInvitation(token)
  const newcomer: Actor = { userId: newId(), name, email }
  await perform(joinAsNew, newcomer, { token, password })
  return { email }
}

async function takePart(
  { tx, actor: { userId }, place: { organisationId }, at }: WriteContext,
  open: Invitation | null,
): Promise<Done<{ projectId: string }>> {
  if (!open) throw new DomainError('conflict', 'This invitation was just used or withdrawn: ask for another one.')
  const { id, projectId, roles, guest, partEndsAt, email } = open
  const before = await tx.projectMembership.findFirst({ where: { projectId, userId } })
  await tx.projectMembership.upsert({
    where: { organisationId_projectId_userId: { organisationId, projectId, userId } },
    create: { organisationId, projectId, userId, roles, addedAt: at, endsAt: partEndsAt },
    update: { roles: [...new Set([...(before?.roles ?? []), ...roles])], endsAt: partEndsAt },
  })
  if (!guest && !(await tx.membership.findFirst({ where: { organisationId, userId } }))) {
    await tx.membership.create({ data: { organisationId, userId, addedAt: at, role: 'member' } })
  }
  await tx.invitation.update({
    where: { organisationId_id: { organisationId, id } },
    data: { acceptedAt: at, acceptedById: userId },
  })
  const subject = { kind: 'person', id: userId }
  return {
    answer: { projectId },
    events: [{ action: 'member-joined', subject, payload: { invitation: id, email, roles, guest, partEndsAt } }],
  }
}
