import 'server-only'
import * as z from 'zod'
import { can } from '@/lib/policy/can'
import { roles as allRoles, type Role } from '@/lib/policy/role'
import { idInput } from '../identity'
import { query } from '../read'

export interface MemberLine {
  userId: string
  name: string
  email: string
  roles: Role[]
  /** Whether the person belongs to the organisation; the others are guests of the project. */
  guest: boolean
  addedAt: string
  endsAt: string | null
  ended: boolean
}

export interface InvitationLine {
  invitationId: string
  name: string
  email: string
  roles: Role[]
  guest: boolean
  invitedBy: string
  expiresAt: string
}

export interface MembersView {
  project: { projectId: string; name: string; organisation: string }
  members: MemberLine[]
  /** Links that nobody has used yet; for those only who may invite. */
  invitations: InvitationLine[]
  manages: boolean
}

const isRole = (word: string): word is Role => allRoles.some((role) => role === word)

/** The people of a project and, for who manages them, the open invitations. */
export const projectMembers = query({
  input: z.object({ projectId: idInput }),
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async () => undefined,
  may: (actor) => can(actor, 'read-study'),
  run: async ({ tx, policy, at, place: { organisationId } }, { projectId }): Promise<MembersView> => {
    const project = await tx.project.findFirstOrThrow({
      where: { id: projectId },
      select: { name: true, organisation: { select: { name: true } } },
    })
    const rows = await tx.projectMembership.findMany({
      where: { projectId },
      include: { user: { select: { name: true, email: true } } },
      orderBy: { addedAt: 'asc' },
    })
    const own = await tx.membership.findMany({ where: { organisationId }, select: { userId: true } })
    const belongs = new Set(own.map(({ userId }) => userId))
    const manages = can(policy, 'manage-members').allowed
    const open = manages
      ? await tx.invitation.findMany({
          where: { projectId, acceptedAt: null, withdrawnAt: null, expiresAt: { gt: at } },
          orderBy: { createdAt: 'asc' },
        })
      : []
    return {
      project: { projectId, name: project.name, organisation: project.organisation.name },
      members: rows.map(({ userId, roles, user, addedAt, endsAt }) => ({
        userId,
        ...user,
        roles: roles.filter(isRole),
        guest: !belongs.has(userId),
        addedAt: addedAt.toISOString(),
        endsAt: endsAt?.toISOString() ?? null,
        ended: endsAt !== null && endsAt <= at,
      })),
      invitations: open.map(({ id, name, email, roles, guest, invitedByName, expiresAt }) => ({
        invitationId: id,
        name,
        email,
        roles: roles.filter(isRole),
        guest,
        invitedBy: invitedByName,
        expiresAt: expiresAt.toISOString(),
      })),
      manages,
    }
  },
})
