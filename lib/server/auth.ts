import 'server-only'
import { betterAuth } from 'better-auth'
import { prismaAdapter } from 'better-auth/adapters/prisma'
import { twoFactor } from 'better-auth/plugins/two-factor'
import { type Database, database } from './db'
import { type Environment, env } from './env'
import { trustedOrigins } from './origins'
import { afterAccountRequest, beforeAccountRequest, recordSession } from './people/auth-hooks'
import { hashPassword, leastPasswordLength, mostPasswordLength, verifyPassword } from './people/password'
import { afterReset, resetMinutes, sendResetLink } from './people/reset-password'

const hour = 3600

/** Identity, sessions and the second factor, and nothing else of the account library; organisations and roles are ours. */
export function makeAuth(db: Database, environment: Environment) {
  const { BASE_URL, BETTER_AUTH_SECRET, TRUSTED_IP_HEADER } = environment
  // by address where a proxy says it; without one all share the count, and the delay of each account does the work
  const each = { window: 60, max: TRUSTED_IP_HEADER ? 30 : 600 }
  return betterAuth({
    appName: 'Breakaway',
    baseURL: BASE_URL,
    secret: BETTER_AUTH_SECRET,
    database: prismaAdapter(db, { provider: 'postgresql' }),
    trustedOrigins: trustedOrigins(environment),
    telemetry: { enabled: false },
    // a name stands in certificates and title blocks, an address is an identity: an administrator changes them. Sessions are
    // listed and ended by our own page, which keeps their secrets from scripts.
    disabledPaths: [
      '/sign-up/email',
      '/update-user',
      '/change-email',
      '/delete-user',
      '/sign-in/social',
      '/link-social',
      '/list-sessions',
      '/revoke-session',
      '/revoke-sessions',
      '/revoke-other-sessions',
      '/two-factor/send-otp',
      '/two-factor/verify-otp',
    ],
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength: leastPasswordLength,
      maxPasswordLength: mostPasswordLength,
      password: { hash: hashPassword, verify: ({ hash, password }) => verifyPassword(hash, password) },
      resetPasswordTokenExpiresIn: resetMinutes * 60,
      revokeSessionsOnPasswordReset: true,
      sendResetPassword: async (asked) => sendResetLink(asked),
      onPasswordReset: async ({ user }) => afterReset(db, user),
    },
    user: { additionalFields: { initialPassword: { type: 'boolean', input: false, defaultValue: false } } },
    session: { expiresIn: 12 * hour, updateAge: hour, cookieCache: { enabled: false } },
    // the link of a reset is kept as its hash
    verification: { storeIdentifier: 'hashed' },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 600,
      customRules: {
        '/sign-in/email': each,
        '/change-password': each,
        '/request-password-reset': each,
        '/reset-password': each,
        '/two-factor/*': each,
      },
    },
    advanced: {
      // said aloud, because the library leaves both out while tests run
      disableOriginCheck: false,
      disableCSRFCheck: false,
      // only a header that the reverse proxy overwrites is believed
      ipAddress: { ipAddressHeaders: TRUSTED_IP_HEADER ? [TRUSTED_IP_HEADER.toLowerCase()] : [] },
      useSecureCookies: BASE_URL.startsWith('https:'),
    },
    logger: { level: 'error' },
    plugins: [
      twoFactor({
        issuer: 'Breakaway',
        twoFactorCookieMaxAge: 600,
        accountLockout: { enabled: true, maxFailedAttempts: 10, durationSeconds: 900 },
      }),
    ],
    hooks: { before: beforeAccountRequest(db), after: afterAccountRequest(db) },
    databaseHooks: {
      session: {
        create: {
          after: async (session, context) =>
            recordSession(db, session, { path: context?.path, replaces: Boolean(context?.context.session) }),
        },
      },
    },
  })
}

export type Auth = ReturnType<typeof makeAuth>

const shared = globalThis as typeof globalThis & { breakawayAuth?: Auth }

/** The account library of this process. */
export function auth(): Auth {
  shared.breakawayAuth ??= makeAuth(database(), env())
  return shared.breakawayAuth
}
