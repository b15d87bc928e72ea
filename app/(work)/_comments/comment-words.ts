import type { CommentClass, CommentState } from '@/lib/study/review-words'

export const classWords: Record<CommentClass, string> = {
  error: 'error',
  request: 'request',
  question: 'question',
  editorial: 'editorial',
}

export const stateWords: Record<CommentState, string> = {
  open: 'open',
  answered: 'answered',
  closed: 'closed',
}

export const entryWords = {
  reply: 'replied',
  accepted: 'accepted',
  refused: 'refused',
  closed: 'closed it',
  reopened: 'took it up again',
  assigned: 'handed it on',
} as const
