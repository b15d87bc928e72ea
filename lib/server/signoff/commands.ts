import 'server-only'
import * as z from 'zod'
import { can } from '@/lib/policy/can'
import { signOffRoles } from '@/lib/study/states'
import { base64Bytes } from '../base64'
import { command } from '../perform'
import { ofRevision } from '../revisions/schema'
import { loadRevision } from '../revisions/subject'
import { beginSignature } from './begin-signature'
import { endSignature } from './end-signature'

const revisionScope = ({ revisionId }: { revisionId: string }) => ({ kind: 'revision' as const, id: revisionId })

/**
 * First step of a signature: the answer holds the octets that the signer's browser signs with the signer's own key, and a token
 * for the second step. Beginning again discards what was begun before.
 */
export const prepareSignature = command({
  input: ofRevision.extend({ role: z.enum(signOffRoles) }),
  scope: revisionScope,
  load: async ({ tx }, { revisionId }) => loadRevision(tx, revisionId),
  may: (actor, { subject }, { role }) => can(actor, `sign-${role}`, subject),
  run: (context, { role }, { row }) => beginSignature(context, row, role),
})

/** Second step: the value is checked against the signer's certificate and put into the file; bytes and sign-off are kept together. */
export const completeSignature = command({
  input: ofRevision.extend({
    token: z.string().min(1).max(100),
    /** Signature value, r then s, 64 octets, base64. */
    value: base64Bytes(64),
  }),
  scope: revisionScope,
  load: async ({ tx, actor }, { revisionId, token }) => endSignature.load(tx, actor, revisionId, token),
  may: (actor, { subject, role }) => can(actor, `sign-${role}`, subject),
  run: (context, { value }, begun) => endSignature.run(context, begun, value),
})
