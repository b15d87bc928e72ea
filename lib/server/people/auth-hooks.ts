import 'server-only'
import { APIError, createAuthMiddleware, getSessionFromCtx } from 'better-auth/api'
import { now } from '../clock'
import type { Database } from '../db'
import { type AccountEvent, recordOfPerson } from './record-of-person'
import { countAttempt, forgetAttempts } from './sign-in-delay'
import { spendCode } from './spend-code'

type Context = Parameters<Parameters<typeof createAuthMiddleware>[0]>[0]

/** Requests of a signed-in person that name the password once more; somebody at a browser left open must not guess it. */
const asksPassword: readonly string[] = [
  '/change-password',
  '/two-factor/enable',
  '/two-factor/disable',
  '/two-factor/generate-backup-codes',
  '/two-factor/get-totp-uri',
]

const secondStep: readonly string[] = ['/two-factor/verify-totp', '/two-factor/verify-backup-code']

const did: Readonly<Record<string, AccountEvent>> = {
  '/change-password': 'password-changed',
  '/two-factor/disable': 'second-factor-removed',
  '/two-factor/generate-backup-codes': 'recovery-codes-made',
}

const refuseWhileWaiting = async (db: Database, account: string): Promise<void> => {
  const seconds = await countAttempt(db, account, now())
  if (seconds === 0) return
  const wait = seconds < 60 ? `${seconds} s` : `${Math.ceil(seconds / 60)} min`
  throw new APIError('TOO_MANY_REQUESTS', {
    code: 'TOO_MANY_ATTEMPTS',
    message: `Too many attempts for this address: wait ${wait} and try again.`,
  })
}

/** Requests for a new password count apart from wrong ones, so that nobody locks somebody else's door by asking. */
const resetKey = (email: string): string => `new password for ${email.trim().toLowerCase()}`

/** Who has given the password and is asked for a code; null when nobody is. */
const pendingPerson = async (context: Context): Promise<string | null> => {
  const { name } = context.context.createAuthCookie('two_factor')
  const identifier = await context.getSignedCookie(name, context.context.secret)
  if (!identifier) return null
  const pending = await context.context.internalAdapter.findVerificationValue(identifier)
  return pending?.value ?? null
}

/** What is asked before a request of the account library goes on: growing delays, and each code once. */
export const beforeAccountRequest = (db: Database) =>
  createAuthMiddleware(async (context) => {
    const { path, body } = context
    if (path === '/sign-in/email') return refuseWhileWaiting(db, String(body?.email ?? ''))
    if (path === '/request-password-reset') return refuseWhileWaiting(db, resetKey(String(body?.email ?? '')))
    if (asksPassword.includes(path)) {
      const session = await getSessionFromCtx(context)
      if (session) await refuseWhileWaiting(db, session.user.email)
      return
    }
    if (!secondStep.includes(path)) return
    // every sign-in asks for the second factor: no browser is excepted from it
    if (body?.trustDevice)
      throw new APIError('BAD_REQUEST', { message: 'No browser is excepted from the second step.' })
    const userId = await pendingPerson(context)
    if (userId && !(await spendCode(db, userId, String(body?.code ?? '')))) {
      throw new APIError('UNAUTHORIZED', { code: 'INVALID_CODE', message: 'Invalid code' })
    }
  })

/** What is written down after a request of the account library went through. */
export const afterAccountRequest = (db: Database) =>
  createAuthMiddleware(async (context) => {
    if (context.context.returned instanceof APIError) return
    const { path, body } = context
    if (path === '/sign-in/email') await forgetAttempts(db, String(body?.email ?? ''))
    const person = context.context.session?.user
    if (!person) return
    if (asksPassword.includes(path)) await forgetAttempts(db, person.email)
    if (path === '/change-password') {
      await db.user.update({ where: { id: person.id }, data: { initialPassword: false } })
    }
    const action = did[path]
    if (action) await recordOfPerson(db, person.id, action)
  })

/** Writes down a new session where it is one that somebody signed in with; a session that merely replaces another is not. */
export async function recordSession(
  db: Database,
  session: { userId: string; ipAddress?: string | null | undefined },
  request: { path?: string | undefined; replaces: boolean },
): Promise<void> {
  const { path, replaces } = request
  const { userId } = session
  if (replaces) {
    if (path === '/two-factor/verify-totp') await recordOfPerson(db, userId, 'second-factor-set')
    return
  }
  const payload = { ipAddress: session.ipAddress || null }
  if (path === '/sign-in/email') {
    const { twoFactorEnabled } = await db.user.findUniqueOrThrow({ where: { id: userId } })
    // the password alone is half of it: this session is taken away again until the code is given
    if (!twoFactorEnabled) await recordOfPerson(db, userId, 'signed-in', payload)
  }
  if (path && secondStep.includes(path)) {
    const by = path === '/two-factor/verify-totp' ? 'authenticator app' : 'recovery code'
    await recordOfPerson(db, userId, 'signed-in', { ...payload, secondFactor: by })
  }
}
