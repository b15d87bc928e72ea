import { allowed, denied, type Permission } from './permission'
import type { PolicyActor } from './role'

/** A comment is closed by whoever made it; an administrator may, and says why. */
export const mayClose = (actor: PolicyActor, authorId: string, reason: string): Permission => {
  if (actor.userId === authorId) return allowed
  if (!actor.roles.includes('administrator'))
    return denied('Only whoever made a comment closes it: answer it, and its author decides.')
  return reason.trim() === '' ? denied('Say why you close somebody else’s comment.') : allowed
}

/** A comment is taken up again by whoever made it. */
export const mayReopen = (actor: PolicyActor, authorId: string): Permission =>
  actor.userId === authorId ? allowed : denied('Only whoever made a comment takes it up again.')
