import type { CommentClass, CommentState, Response } from './review-words'

/** Somebody who can be asked in a review. */
export interface Participant {
  userId: string
  name: string
}

/** What was written below a comment. */
export interface EntryLine {
  id: string
  kind: 'reply' | 'accepted' | 'refused' | 'closed' | 'reopened' | 'assigned'
  text: string
  author: string
  at: string
}

/** A comment as a revision shows it. */
export interface CommentLine {
  commentId: string
  number: number
  anchor: string
  /** Words of what it is about, in this revision, or of its time where that is gone. */
  about: string
  /** The value there when it was made; null for what is no single value. */
  valueThen: string | null
  /** The value there in this revision. */
  valueNow: string | null
  /** True where record, case or limit no longer exist in this revision. */
  orphaned: boolean
  /** Number of the revision in which it was made, where that is an earlier one. */
  carriedFrom: number | null
  kind: CommentClass
  text: string
  author: string
  authorId: string
  at: string
  assignee: string | null
  dueOn: string | null
  state: CommentState
  response: Response | null
  closedAt: string | null
  entries: EntryLine[]
  mayClose: boolean
  mayReopen: boolean
}

/** What holds up the closing of a review until it is settled or waived. */
export interface HoldUp {
  kind: 'check' | 'comment'
  subjectId: string
  what: string
  waived: { reason: string; person: string; at: string } | null
}

export interface CommentsView {
  /** Place in the project's chain of events that this view stands at; an older view never replaces a newer one. */
  sequence: number
  revisionId: string
  comments: CommentLine[]
  people: Participant[]
  holdUps: HoldUp[]
  may: { comment: boolean; respond: boolean; waive: boolean }
}
