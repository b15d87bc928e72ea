/** What the account library answered. */
export interface AccountAnswer {
  ok: boolean
  status: number
  code: string | null
  message: string | null
  body: Record<string, unknown>
}

const textIn = (body: Record<string, unknown>, name: string): string | null => {
  const value = body[name]
  return typeof value === 'string' ? value : null
}

/** Asks the account library from the browser; a lost connection is an answer too. */
export async function postAccount(path: string, body: Record<string, unknown>): Promise<AccountAnswer> {
  const answer = await fetch(`/api/auth${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
    body: JSON.stringify(body),
  }).catch(() => null)
  const read: unknown = await answer?.json().catch(() => null)
  const found = typeof read === 'object' && read !== null ? Object.fromEntries(Object.entries(read)) : {}
  return {
    ok: answer?.ok ?? false,
    status: answer?.status ?? 0,
    code: textIn(found, 'code'),
    message: textIn(found, 'message'),
    body: found,
  }
}

/** Why an account request was refused, in a sentence; the refusals that a page knows better come first. */
export const accountRefusal = (
  { status, code, message }: AccountAnswer,
  known: Readonly<Record<string, string>>,
): string => {
  const sentence = code ? known[code] : undefined
  if (sentence) return sentence
  if (code === 'INVALID_PASSWORD') return 'The password is not right: type it again.'
  if (code === 'PASSWORD_TOO_SHORT') return 'This password is too short: use 12 characters or more.'
  if (code === 'PASSWORD_TOO_LONG') return 'This password is too long: use 128 characters or fewer.'
  if (code === 'TOO_MANY_ATTEMPTS' && message) return message
  if (status === 429) return 'Too many attempts: wait a quarter of an hour and try again.'
  if (status === 401) return 'Your session has ended: sign in again, then repeat this.'
  return 'The server did not do it: try again in a moment.'
}
