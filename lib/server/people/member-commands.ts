import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { idInput } from '../identity'
import { command } from '../perform'
import { lastDay, projectRoles } from './schema'

/** Replaces a person's roles in a project, and the day on which their part ends; without any role the person leaves it. */
export const changeMember = command({
  input: z.object({
    projectId: idInput,
    userId: idInput,
    roles: z.union([projectRoles, z.tuple([])]),
    /** Left out, the end stays as it was; null takes it away. */
    lastDay: lastDay.nullable().optional(),
  }),
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async ({ tx }, { projectId, userId }) => tx.projectMembership.findFirst({ where: { projectId, userId } }),
  may: (actor) => can(actor, 'manage-members'),
  run: async ({ tx, place: { organisationId } }, { projectId, userId, roles, lastDay: endsAt }, before) => {
    if (!before) throw new DomainError('not-found', 'This person has no part in the project.')
    const where = { organisationId_projectId_userId: { organisationId, projectId, userId } }
    if (roles.length === 0) await tx.projectMembership.delete({ where })
    else {
      const end = endsAt === undefined ? {} : { endsAt }
      await tx.projectMembership.update({ where, data: { roles: [...roles], ...end } })
    }
    return {
      answer: { userId, roles },
      events: [
        {
          action: 'member-changed',
          subject: { kind: 'person', id: userId },
          payload: { before: before.roles, roles, endsAt: endsAt === undefined ? before.endsAt : endsAt },
        },
      ],
    }
  },
})
