import type { RevisionMove, RevisionState, SignOffRole } from '../study/states'
import { nextSignature, nextState, revisionStateWords } from '../study/states'
import { allowed, denied, type Permission } from './permission'
import type { PolicyActor, Role } from './role'
import type { RevisionSubject } from './subject'

export const holds = (actor: PolicyActor, any: readonly Role[], otherwise: string): Permission =>
  any.some((role) => actor.roles.includes(role)) ? allowed : denied(otherwise)

export const inState = (subject: RevisionSubject, states: readonly RevisionState[]): Permission =>
  states.includes(subject.state)
    ? allowed
    : denied(`Not possible while the revision is ${revisionStateWords[subject.state]}.`)

export const moves = (subject: RevisionSubject, move: RevisionMove): Permission =>
  nextState(subject.state, move) === null
    ? denied(`Not possible while the revision is ${revisionStateWords[subject.state]}.`)
    : allowed

export const isPreparer = (actor: PolicyActor, subject: RevisionSubject): Permission =>
  actor.userId === subject.preparedBy ? allowed : denied('Only the engineer who prepared this revision does this.')

/** The second pair of eyes is never the first. */
export const isNotPreparer = (actor: PolicyActor, subject: RevisionSubject): Permission =>
  actor.userId === subject.preparedBy ? denied('Whoever prepared a revision neither checks nor approves it.') : allowed

export const isNotChecker = (actor: PolicyActor, subject: RevisionSubject): Permission =>
  actor.userId === subject.checkedBy ? denied('Whoever checked a revision does not approve it.') : allowed

export const signatureIsDue = (subject: RevisionSubject, role: SignOffRole): Permission => {
  const due = nextSignature(subject.signed)
  if (due === role) return allowed
  return denied(due === null ? 'All three have signed.' : `The signature that is due next is “${due}”.`)
}

export const roundIsOpen = (subject: RevisionSubject): Permission =>
  nextSignature(subject.signed) === null
    ? denied('All three have signed; the revision is issued or withdrawn, and changes go into the next one.')
    : allowed

export const allHaveSigned = (subject: RevisionSubject): Permission => {
  const due = nextSignature(subject.signed)
  return due === null ? allowed : denied(`The signature “${due}” is missing.`)
}
