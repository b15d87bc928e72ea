/** What is done to the organisation or to live records, whatever state a revision is in. */
export const liveActions = [
  'create-project',
  'manage-members',
  'manage-certificates',
  'read-plant',
  'edit-plant',
  'read-study',
  'edit-study',
  'compute',
  'freeze',
] as const

/** What is done to one frozen revision. */
export const revisionActions = [
  'read-revision',
  'read-comments',
  'comment',
  'respond-comment',
  'close-comment',
  'tick-input',
  'waive',
  'send-for-check',
  'accept-check',
  'reject-check',
  'accept-review',
  'reject-review',
  'close-review',
  'back-to-draft',
  'sign-prepared',
  'sign-checked',
  'sign-approved',
  'issue',
  'withdraw',
  'download-report',
  'share-report',
  'end-share',
] as const

export type LiveAction = (typeof liveActions)[number]
export type RevisionAction = (typeof revisionActions)[number]
export type Action = LiveAction | RevisionAction
