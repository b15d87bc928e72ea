import { can } from '@/lib/policy/can'
import type { PolicyActor } from '@/lib/policy/role'
import type { FeedEvent } from './read-events'

/** Whether somebody may learn that this happened: the team of everything, others of what concerns a revision that they read. */
export const mayLearn = (actor: PolicyActor, { event, subject }: FeedEvent): boolean => {
  if (can(actor, 'read-study').allowed) return true
  if (!subject) return false
  return can(actor, event.subject.kind === 'comment' ? 'read-comments' : 'read-revision', subject).allowed
}
