import type { RevisionState, SignOffRole } from '@/lib/study/states'

export const stateWords: Record<RevisionState, string> = {
  draft: 'draft',
  'in-check': 'in check',
  'in-review': 'in review',
  'review-closed': 'review closed, being signed',
  issued: 'issued',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
}

export const signOffWords: Record<SignOffRole, string> = {
  prepared: 'Prepared',
  checked: 'Checked',
  approved: 'Approved',
}
