import type { RevisionState } from '../study/states'
import type { RevisionAction } from './action'
import {
  allHaveSigned,
  holds,
  inState,
  isNotChecker,
  isNotPreparer,
  isPreparer,
  moves,
  roundIsOpen,
  signatureIsDue,
} from './conditions'
import { all, allowed, denied, type Permission } from './permission'
import type { PolicyActor } from './role'
import type { RevisionSubject } from './subject'

type Rule = (actor: PolicyActor, subject: RevisionSubject) => Permission

const engineer = (actor: PolicyActor) => holds(actor, ['engineer'], 'Only an engineer of the project does this.')
const checker = (actor: PolicyActor) => holds(actor, ['checker'], 'Only a checker of the project does this.')
const approver = (actor: PolicyActor) => holds(actor, ['approver'], 'Only an approver of the project does this.')

const team = ['engineer', 'checker', 'approver', 'administrator'] as const
const shown = ['in-review', 'review-closed', 'issued', 'superseded', 'withdrawn'] as const
const published = ['issued', 'superseded', 'withdrawn'] as const

/** The team reads every revision, a commenter what is or was out for review, a client what was issued. */
const reads: Rule = (actor, subject) => {
  if (team.some((role) => actor.roles.includes(role))) return allowed
  if (actor.roles.includes('commenter'))
    return shown.some((state) => state === subject.state) ? allowed : denied('This revision is not out for review.')
  if (actor.roles.includes('client'))
    return published.some((state) => state === subject.state) ? allowed : denied('This revision is not issued.')
  return denied('You have no part in this project.')
}

const comments: Rule = (actor, subject) =>
  subject.state === 'in-check'
    ? holds(actor, ['engineer', 'checker'], 'Until the check is accepted only the engineer and the checker comment.')
    : all(
        inState(subject, ['in-review']),
        holds(actor, ['engineer', 'checker', 'approver', 'commenter'], 'Only those who review this revision comment.'),
      )

/** What is said in a review is for those who work on it; whoever receives the report reads the sheet that it prints. */
const readsComments: Rule = (actor, subject) =>
  all(
    reads(actor, subject),
    holds(actor, [...team, 'commenter'], 'Comments are for those who review; the report prints their sheet.'),
  )

/** Until the review is closed a comment can be settled, also while its revision is back at the preparer. */
const unsettled: readonly RevisionState[] = ['draft', 'in-check', 'in-review']

const checks =
  (move: 'accept-check' | 'reject-check'): Rule =>
  (actor, subject) =>
    all(checker(actor), isNotPreparer(actor, subject), moves(subject, move))

const reviews =
  (move: 'accept-review' | 'reject-review' | 'close-review'): Rule =>
  (actor, subject) =>
    all(approver(actor), isNotPreparer(actor, subject), isNotChecker(actor, subject), moves(subject, move))

/** Who hands out links answers for the project; the log of downloads is for the same people. */
const shares =
  (states: readonly RevisionState[]): Rule =>
  (actor, subject) =>
    all(
      holds(
        actor,
        ['engineer', 'approver', 'administrator'],
        'Only an engineer, an approver or an administrator shares a report by link.',
      ),
      inState(subject, states),
    )

/** One rule an action; sentences of the trade, in the order in which a refusal helps most. */
export const revisionRules: Record<RevisionAction, Rule> = {
  'read-revision': reads,
  'download-report': reads,
  // what no longer stands is not handed out anew; links that are out can still be ended
  'share-report': shares(['issued']),
  'end-share': shares(published),
  'read-comments': readsComments,
  comment: comments,
  'respond-comment': (actor, subject) =>
    all(
      holds(
        actor,
        ['engineer', 'checker', 'approver'],
        'Only an engineer, a checker or an approver answers for the study.',
      ),
      inState(subject, unsettled),
    ),
  // whose comment it is stands with the comment: see comment-rules
  'close-comment': (actor, subject) =>
    all(
      readsComments(actor, subject),
      holds(actor, [...team, 'commenter'], 'Only those who review close comments.'),
      inState(subject, unsettled),
    ),
  'tick-input': (actor, subject) => all(checker(actor), isNotPreparer(actor, subject), inState(subject, ['in-check'])),
  waive: (actor, subject) =>
    all(approver(actor), isNotPreparer(actor, subject), isNotChecker(actor, subject), inState(subject, ['in-review'])),
  'send-for-check': (actor, subject) =>
    all(engineer(actor), isPreparer(actor, subject), moves(subject, 'send-for-check')),
  'accept-check': checks('accept-check'),
  'reject-check': checks('reject-check'),
  'accept-review': reviews('accept-review'),
  'reject-review': reviews('reject-review'),
  'close-review': (actor, subject) =>
    all(
      reviews('close-review')(actor, subject),
      subject.reviewAccepted ? allowed : denied('Accept the review before closing it.'),
    ),
  'back-to-draft': (actor, subject) =>
    all(
      actor.userId === subject.preparedBy
        ? engineer(actor)
        : holds(actor, ['checker', 'approver'], 'Only the preparer, a checker or an approver sends a revision back.'),
      moves(subject, 'back-to-draft'),
      roundIsOpen(subject),
    ),
  'sign-prepared': (actor, subject) =>
    all(
      engineer(actor),
      isPreparer(actor, subject),
      inState(subject, ['review-closed']),
      signatureIsDue(subject, 'prepared'),
    ),
  'sign-checked': (actor, subject) =>
    all(
      checker(actor),
      isNotPreparer(actor, subject),
      actor.userId === subject.checkedBy ? allowed : denied('Only the checker who accepted the check signs it.'),
      inState(subject, ['review-closed']),
      signatureIsDue(subject, 'checked'),
    ),
  'sign-approved': (actor, subject) =>
    all(
      approver(actor),
      isNotPreparer(actor, subject),
      isNotChecker(actor, subject),
      inState(subject, ['review-closed']),
      signatureIsDue(subject, 'approved'),
    ),
  issue: (actor, subject) =>
    all(
      approver(actor),
      moves(subject, 'issue'),
      allHaveSigned(subject),
      actor.userId === subject.approvedBy ? allowed : denied('The approver who signed issues the revision.'),
    ),
  withdraw: (actor, subject) =>
    all(
      holds(actor, ['approver', 'administrator'], 'Only an approver or an administrator withdraws a revision.'),
      moves(subject, 'withdraw'),
      subject.state === 'review-closed' ? allHaveSigned(subject) : allowed,
    ),
}
