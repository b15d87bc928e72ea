import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { chainStart } from '../audit'
import { base64Bytes } from '../base64'
import { idInput, newId } from '../identity'
import { command } from '../perform'
import { issueCertificate } from '../signoff/issue-certificate'
import { createAccount } from './create-account'
import { makePassword } from './password'
import { clientName, emailAddress, personName, projectName, projectRoles } from './schema'

/** Starts a project; whoever starts it becomes its engineer, an administrator without a project role its administrator. */
export const createProject = command({
  input: z.object({ organisationId: idInput.optional(), name: projectName, client: clientName }),
  scope: ({ organisationId }) => ({ kind: 'organisation' as const, id: organisationId }),
  load: async () => undefined,
  may: (actor) => can(actor, 'create-project'),
  run: async ({ tx, actor, place, policy, at }, { name, client }) => {
    const { organisationId } = place
    const id = newId()
    await tx.project.create({ data: { organisationId, id, name, client, createdAt: at, auditHash: chainStart } })
    const roles = policy.roles.includes('engineer') ? ['engineer'] : ['administrator']
    await tx.projectMembership.create({
      data: { organisationId, projectId: id, userId: actor.userId, roles, addedAt: at },
    })
    return {
      answer: { projectId: id },
      events: [{ action: 'project-created', subject: { kind: 'project', id }, payload: { name, client } }],
    }
  },
})

/**
 * Gives a person a part in a project, and an account if there is none for the address: then the answer holds the password,
 * shown once, to hand over. A guest does not become a member of the organisation, so cannot sign.
 * @public
 */
export const addMember = command({
  input: z.object({
    projectId: idInput,
    name: personName,
    email: emailAddress,
    roles: projectRoles,
    guest: z.boolean().default(false),
  }),
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async ({ tx }, { email }) => tx.user.findUnique({ where: { email }, select: { id: true } }),
  may: (actor) => can(actor, 'manage-members'),
  run: async ({ tx, place: { organisationId }, at }, { projectId, name, email, roles, guest }, known) => {
    const password = known ? null : makePassword()
    const userId =
      known?.id ??
      (await createAccount(tx, { name, email, password: password ?? '', initialPassword: true }, at)).userId
    const added = { organisationId, userId, addedAt: at }
    if (await tx.projectMembership.findFirst({ where: { projectId, userId } })) {
      throw new DomainError('conflict', 'This person has a part in the project already: change their roles instead.')
    }
    await tx.projectMembership.create({ data: { ...added, projectId, roles } })
    if (!guest && !(await tx.membership.findFirst({ where: { organisationId, userId } }))) {
      await tx.membership.create({ data: { ...added, role: 'member' } })
    }
    return {
      answer: { userId, initialPassword: password },
      events: [{ action: 'member-added', subject: { kind: 'person', id: userId }, payload: { email, roles, guest } }],
    }
  },
})

/**
 * Replaces a person's roles in a project; without any the person leaves it.
 * @public
 */
export const changeMember = command({
  input: z.object({ projectId: idInput, userId: idInput, roles: z.union([projectRoles, z.tuple([])]) }),
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async ({ tx }, { projectId, userId }) => tx.projectMembership.findFirst({ where: { projectId, userId } }),
  may: (actor) => can(actor, 'manage-members'),
  run: async ({ tx, place: { organisationId } }, { projectId, userId, roles }, before) => {
    if (!before) throw new DomainError('not-found', 'This person has no part in the project.')
    const where = { organisationId_projectId_userId: { organisationId, projectId, userId } }
    if (roles.length === 0) await tx.projectMembership.delete({ where })
    else await tx.projectMembership.update({ where, data: { roles: [...roles] } })
    return {
      answer: { userId, roles },
      events: [
        { action: 'member-changed', subject: { kind: 'person', id: userId }, payload: { before: before.roles, roles } },
      ],
    }
  },
})

/**
 * Puts the person's new signing key on the organisation's list: its authority issues a certificate for it. The key itself stays with
 * the person; the proof shows that they hold it.
 */
export const registerCertificate = command({
  input: z.object({
    organisationId: idInput.optional(),
    /** Public key, DER, base64. */
    spki: base64Bytes(200),
    /** The challenge that was answered, base64. */
    challenge: base64Bytes(64),
    /** Proof of possession: r then s, 64 octets, base64. */
    proof: base64Bytes(64),
  }),
  scope: ({ organisationId }) => ({ kind: 'organisation' as const, id: organisationId }),
  load: async () => undefined,
  // everybody registers a key of their own and nobody else's
  may: () => ({ allowed: true }),
  run: (context, input) => issueCertificate(context, input),
})
