import 'server-only'
import { betterAuth } from 'better-auth'
import { prismaAdapter } from 'better-auth/adapters/prisma'
import { APIError, createAuthMiddleware } from 'better-auth/api'
import { now } from './clock'
import { type Database, database } from './db'
import { type Environment, env } from './env'
import { trustedOrigins } from './origins'
import { hashPassword, leastPasswordLength, verifyPassword } from './people/password'
import { recordSignIn } from './people/record-sign-in'
import { countAttempt, forgetAttempts } from './people/sign-in-delay'

const hour = 3600

/** Identity and sessions, and nothing else of the account library; organisations and roles are ours. */
export function makeAuth(db: Database, environment: Environment) {
  const { BASE_URL, BETTER_AUTH_SECRET, TRUSTED_IP_HEADER } = environment
  return betterAuth({
    appName: 'Breakaway',
    baseURL: BASE_URL,
    secret: BETTER_AUTH_SECRET,
    database: prismaAdapter(db, { provider: 'postgresql' }),
    trustedOrigins: trustedOrigins(environment),
    telemetry: { enabled: false },
    // a name stands in certificates and title blocks, an address is an identity: an administrator changes them
    disabledPaths: [
      '/sign-up/email',
      '/update-user',
      '/change-email',
      '/delete-user',
      '/sign-in/social',
      '/link-social',
    ],
    emailAndPassword: {
      enabled: true,
      disableSignUp: true,
      minPasswordLength: leastPasswordLength,
      password: { hash: hashPassword, verify: ({ hash, password }) => verifyPassword(hash, password) },
    },
    user: { additionalFields: { initialPassword: { type: 'boolean', input: false, defaultValue: false } } },
    session: { expiresIn: 12 * hour, updateAge: hour, cookieCache: { enabled: false } },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 600,
      // by address where a proxy says it; without one all share the count, and the delay of each account does the work
      customRules: { '/sign-in/email': { window: 60, max: TRUSTED_IP_HEADER ? 30 : 600 } },
    },
    advanced: {
      // only a header that the reverse proxy overwrites is believed
      ipAddress: { ipAddressHeaders: TRUSTED_IP_HEADER ? [TRUSTED_IP_HEADER.toLowerCase()] : [] },
      useSecureCookies: BASE_URL.startsWith('https:'),
    },
    logger: { level: 'error' },
    hooks: {
      before: createAuthMiddleware(async (context) => {
        if (context.path !== '/sign-in/email') return
        const seconds = await countAttempt(db, String(context.body?.email ?? ''), now())
        if (seconds === 0) return
        const wait = seconds < 60 ? `${seconds} s` : `${Math.ceil(seconds / 60)} min`
        throw new APIError('TOO_MANY_REQUESTS', {
          code: 'TOO_MANY_ATTEMPTS',
          message: `Too many wrong passwords for this address: wait ${wait} and try again.`,
        })
      }),
      after: createAuthMiddleware(async (context) => {
        if (context.context.returned instanceof APIError) return
        if (context.path === '/sign-in/email') await forgetAttempts(db, String(context.body?.email ?? ''))
        const person = context.context.session?.user
        if (context.path === '/change-password' && person) {
          await db.user.update({ where: { id: person.id }, data: { initialPassword: false } })
        }
      }),
    },
    databaseHooks: {
      session: {
        create: { after: async (session) => recordSignIn(db, session.userId, session.ipAddress || null) },
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
