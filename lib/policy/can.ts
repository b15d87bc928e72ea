import { type Action, type LiveAction, type RevisionAction, revisionActions } from './action'
import { holds } from './conditions'
import { liveRules } from './live-rules'
import type { Permission } from './permission'
import { revisionRules } from './revision-rules'
import type { PolicyActor } from './role'
import type { RevisionSubject } from './subject'

const isRevisionAction = (action: Action): action is RevisionAction => revisionActions.some((one) => one === action)

/**
 * Whether an actor may do this now, or the sentence that says why not. Pure: the same question always has the same
 * answer. An action on a revision needs its subject; asking without one is a bug and throws.
 */
export function can(actor: PolicyActor, action: LiveAction): Permission
export function can(actor: PolicyActor, action: RevisionAction, subject: RevisionSubject): Permission
export function can(actor: PolicyActor, action: Action, subject?: RevisionSubject): Permission {
  if (isRevisionAction(action)) {
    if (!subject) throw new RangeError(`${action} was asked without a revision`)
    return revisionRules[action](actor, subject)
  }
  const { roles, otherwise } = liveRules[action]
  return holds(actor, roles, otherwise)
}

/** The actions on a revision that an actor may take now, in the order of a revision's life. */
export const allowedActions = (actor: PolicyActor, subject: RevisionSubject): readonly RevisionAction[] =>
  revisionActions.filter((action) => can(actor, action, subject).allowed)
