import type { RevisionState, SignOffRole } from '../study/states'

/** What policy needs to know of a revision; people are user ids. */
export interface RevisionSubject {
  state: RevisionState
  /** Who froze the revision and so prepared it. */
  preparedBy: string
  /** Who accepted the check of this revision; null before that. */
  checkedBy: string | null
  /** Whether an approver accepted the review of this revision. */
  reviewAccepted: boolean
  /** Signatures given in the running round. */
  signed: readonly SignOffRole[]
  /** Who signed as approver; null before that. */
  approvedBy: string | null
}
