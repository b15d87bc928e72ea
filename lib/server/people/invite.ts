import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { idInput, newId } from '../identity'
import { linkDigest, makeLinkToken } from '../link-token'
import { command } from '../perform'
import { emailAddress, lastDay, personName, projectRoles } from './schema'

const day = 86_400_000

/** Parts that only a member of the organisation takes: who signs needs a certificate from its authority. */
const membersOnly = ['engineer', 'checker', 'approver'] as const

/**
 * Invites somebody to a project. The answer holds the secret of the link, which is shown once and never kept. Whether there is an
 * account for the address is not said: that is nobody's business but its owner's.
 */
export const inviteMember = command({
  input: z
    .object({
      projectId: idInput,
      name: personName,
      email: emailAddress,
      roles: projectRoles,
      guest: z.boolean(),
      /** How long the link itself may be used. */
      days: z.int().min(1, 'Give a day or more.').max(30, 'Keep it within 30 days.').default(7),
      /** The last day of the part; a guest's always ends. */
      lastDay: lastDay.nullable().default(null),
    })
    .refine(({ guest, roles }) => !guest || !membersOnly.some((role) => roles.includes(role)), {
      path: ['roles'],
      message: 'A guest comments or is the client: make who prepares, checks or approves a member.',
    })
    .refine(({ guest, lastDay: end }) => !guest || end !== null, {
      path: ['lastDay'],
      message: 'Give the last day of a guest’s access.',
    }),
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async ({ tx, at }, { projectId, email }) => ({
    open: await tx.invitation.findFirst({
      where: { projectId, email, acceptedAt: null, withdrawnAt: null, expiresAt: { gt: at } },
      select: { id: true },
    }),
    member: await tx.projectMembership.findFirst({ where: { projectId, user: { email } }, select: { userId: true } }),
  }),
  may: (actor) => can(actor, 'manage-members'),
  run: async ({ tx, actor, place: { organisationId }, at }, input, { open, member }) => {
    const { projectId, name, email, roles, guest, days, lastDay: partEndsAt } = input
    if (member) {
      throw new DomainError('conflict', 'This person has a part in the project already: change their roles instead.')
    }
    if (open) {
      throw new DomainError(
        'conflict',
        'There is an open invitation for this address: withdraw it before making another.',
      )
    }
    const token = makeLinkToken()
    const id = newId()
    const expiresAt = new Date(at.getTime() + days * day)
    await tx.invitation.create({
      data: {
        organisationId,
        id,
        projectId,
        tokenHash: linkDigest(token),
        name,
        email,
        roles,
        guest,
        partEndsAt,
        invitedById: actor.userId,
        invitedByName: actor.name,
        createdAt: at,
        expiresAt,
      },
    })
    return {
      answer: { invitationId: id, token, expiresAt: expiresAt.toISOString() },
      events: [
        { action: 'member-invited', subject: { kind: 'invitation', id }, payload: { email, roles, guest, partEndsAt } },
      ],
    }
  },
})

/** Takes an invitation back that nobody has accepted yet; its link is dead from now on. */
export const withdrawInvitation = command({
  input: z.object({ projectId: idInput, invitationId: idInput }),
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async ({ tx }, { projectId, invitationId }) =>
    tx.invitation.findFirst({ where: { id: invitationId, projectId, acceptedAt: null, withdrawnAt: null } }),
  may: (actor) => can(actor, 'manage-members'),
  run: async ({ tx, place: { organisationId }, at }, { invitationId: id }, open) => {
    if (!open) throw new DomainError('not-found', 'This invitation is no longer open.')
    await tx.invitation.update({ where: { organisationId_id: { organisationId, id } }, data: { withdrawnAt: at } })
    return {
      answer: { invitationId: id },
      events: [{ action: 'invitation-withdrawn', subject: { kind: 'invitation', id }, payload: { email: open.email } }],
    }
  },
})
