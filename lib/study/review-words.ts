/** What a comment is, which decides what it holds up. */
export const commentClasses = ['error', 'request', 'question', 'editorial'] as const

/** Where a comment stands: without an answer, answered in writing, closed. */
export const commentStates = ['open', 'answered', 'closed'] as const

/** How a comment was answered; a refusal has its reason. */
export const responses = ['accepted', 'refused'] as const

export type CommentClass = (typeof commentClasses)[number]
export type CommentState = (typeof commentStates)[number]
export type Response = (typeof responses)[number]
