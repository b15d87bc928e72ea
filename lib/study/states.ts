/** Where a revision stands, in the order of its life. A frozen revision that was not sent yet, or went back, is a draft. */
export const revisionStates = [
  'draft',
  'in-check',
  'in-review',
  'review-closed',
  'issued',
  'superseded',
  'withdrawn',
] as const

export type RevisionState = (typeof revisionStates)[number]

/** The signatures of the round, in the order in which they are given. */
export const signOffRoles = ['prepared', 'checked', 'approved'] as const

export type SignOffRole = (typeof signOffRoles)[number]

/** What moves a revision on, or back; superseding is done by issuing the next revision, never by hand. */
export const revisionMoves = [
  'send-for-check',
  'accept-check',
  'reject-check',
  'accept-review',
  'reject-review',
  'close-review',
  'back-to-draft',
  'issue',
  'supersede',
  'withdraw',
] as const

export type RevisionMove = (typeof revisionMoves)[number]

interface Transition {
  from: readonly RevisionState[]
  to: RevisionState
}

/** The whole life of a revision; a move that is not listed for a state does not exist there. */
export const revisionTransitions: Record<RevisionMove, Transition> = {
  'send-for-check': { from: ['draft'], to: 'in-check' },
  'accept-check': { from: ['in-check'], to: 'in-review' },
  'reject-check': { from: ['in-check'], to: 'draft' },
  // Accepting the review is recorded and leaves the revision out for review until it is closed.
  'accept-review': { from: ['in-review'], to: 'in-review' },
  'reject-review': { from: ['in-review'], to: 'draft' },
  'close-review': { from: ['in-review'], to: 'review-closed' },
  'back-to-draft': { from: ['in-check', 'in-review', 'review-closed'], to: 'draft' },
  issue: { from: ['review-closed'], to: 'issued' },
  supersede: { from: ['issued'], to: 'superseded' },
  // A fully signed file that must not go out is withdrawn, because it can no longer go back to draft.
  withdraw: { from: ['review-closed', 'issued'], to: 'withdrawn' },
}

/** The state after a move, or null where the move does not exist in that state. */
export const nextState = (state: RevisionState, move: RevisionMove): RevisionState | null => {
  const { from, to } = revisionTransitions[move]
  return from.includes(state) ? to : null
}

/** The signature that is due next in the round; null when all three are given. */
export const nextSignature = (given: readonly SignOffRole[]): SignOffRole | null =>
  signOffRoles.find((role) => !given.includes(role)) ?? null

/** How each state reads behind “the revision is”. */
export const revisionStateWords: Record<RevisionState, string> = {
  draft: 'a draft',
  'in-check': 'in check',
  'in-review': 'in review',
  'review-closed': 'closed for review and being signed',
  issued: 'issued',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
}
