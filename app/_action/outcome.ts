import type { ErrorCode, FieldIssue } from '@/lib/errors'

/** What a page gets back from an action: the answer, or a refusal that it can show beside what was typed. */
export type Outcome<T> = { ok: true; value: T } | Refusal

export interface Refusal {
  ok: false
  code: ErrorCode
  message: string
  issues: readonly FieldIssue[]
  detail: unknown
}

const noAnswer: Refusal = {
  ok: false,
  code: 'unavailable',
  message: 'The server did not answer. What you typed stays here: try again in a moment.',
  issues: [],
  detail: null,
}

/** Runs an action from the browser; a lost connection or a stopped server is a refusal too, and loses no text. */
export const answered = async <T>(call: () => Promise<Outcome<T>>): Promise<Outcome<T>> => {
  try {
    return await call()
  } catch {
    return noAnswer
  }
}
