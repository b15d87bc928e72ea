import 'server-only'
import * as z from 'zod'
import { can } from '@/lib/policy/can'
import { chainStart } from '../audit'
import { base64Bytes } from '../base64'
import { idInput, newId } from '../identity'
import { command } from '../perform'
import { issueCertificate } from '../signoff/issue-certificate'
import { clientName, projectName } from './schema'

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
