/** Every reason for which a command, a query or a file may be refused; closed, so that each has one HTTP status and one wording. */
export type ErrorCode =
  | 'invalid'
  | 'not-signed-in'
  | 'forbidden'
  | 'not-found'
  | 'conflict'
  | 'wrong-state'
  | 'too-large'
  | 'too-many'
  | 'unsupported'
  | 'unavailable'

/** What is wrong with one field: the path from the root of the input and one sentence that says what to do. */
export interface FieldIssue {
  path: readonly (string | number)[]
  message: string
}

/** A refusal: a closed code, a sentence that is safe to show, and what is wrong with each field. A bug throws something else. */
export class DomainError extends Error {
  readonly code: ErrorCode
  readonly issues: readonly FieldIssue[]
  /** What the user needs to resolve the refusal, for example both sides of a conflict. */
  readonly detail: unknown

  constructor(code: ErrorCode, message: string, issues: readonly FieldIssue[] = [], detail?: unknown) {
    super(message)
    this.name = 'DomainError'
    this.code = code
    this.issues = issues
    this.detail = detail
  }
}

/** The one table from refusal to HTTP status. */
export const httpStatus: Record<ErrorCode, number> = {
  invalid: 422,
  'not-signed-in': 401,
  forbidden: 403,
  'not-found': 404,
  conflict: 409,
  'wrong-state': 409,
  'too-large': 413,
  'too-many': 429,
  unsupported: 415,
  unavailable: 503,
}

/** An outcome that may be a refusal, for pure functions that must not throw. */
export type Result<T> = { ok: true; value: T } | { ok: false; error: DomainError }
