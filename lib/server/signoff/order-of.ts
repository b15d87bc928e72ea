import type { SignatureOrder } from '@/lib/seal/prepare-signature'
import type { SignOffFieldName } from '@/lib/seal/sign-off-fields'
import type { SignOffRole } from '@/lib/study/states'

const fields: Record<SignOffRole, SignOffFieldName> = { prepared: 'Prepared', checked: 'Checked', approved: 'Approved' }

const reasons: Record<SignOffRole, string> = {
  prepared: 'Prepared this study',
  checked: 'Checked this study',
  approved: 'Approved this study',
}

/** Everything that the file's next revision depends on: the same order on the same file gives the same bytes. */
export const orderOf = (
  role: SignOffRole,
  certificate: Uint8Array,
  chain: readonly Uint8Array[],
  at: Date,
): SignatureOrder => ({ field: fields[role], certificate, chain, at, reason: reasons[role] })

/** The fields of a report that must be signed, in their order. */
export const expectedFields: readonly SignOffFieldName[] = [fields.prepared, fields.checked, fields.approved]
