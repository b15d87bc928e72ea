import type { StudyResult } from '../engine/study-run'
import type { ErrorCode, FieldIssue } from '../errors'
import type { StudyDocument } from '../study/document/study-document'

/** What a computing thread is asked. */
export interface ComputeTask {
  document: StudyDocument
}

/** How far a computing thread has come, in cases. */
export interface ComputeProgress {
  done: number
  of: number
}

/** A refusal as it crosses the border of a thread, where classes lose their kind. */
export interface Refusal {
  code: ErrorCode
  message: string
  issues: readonly FieldIssue[]
}

/** The end of a computation. */
export type ComputeOutcome = { kind: 'computed'; result: StudyResult } | { kind: 'refused'; refusal: Refusal }

/** What the thread of a browser says, in order: progress any number of times, then one end. */
export type BrowserMessage =
  | ({ kind: 'progress' } & ComputeProgress)
  | ComputeOutcome
  | { kind: 'failed'; message: string }
