import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import type { Actor } from '../actor'
import { now } from '../clock'
import { type Database, database } from '../db'
import { idInput } from '../identity'
import { parseInput } from '../parse-input'
import { recordOfPerson } from './record-of-person'

export interface SessionLine {
  sessionId: string
  /** Browser and system as they name themselves. */
  client: string
  ipAddress: string | null
  since: string
  lastUsed: string
  here: boolean
}

const named = (words: readonly [RegExp, string][], text: string): string | undefined =>
  words.find(([pattern]) => pattern.test(text))?.[1]

/** What a browser says of itself, shortened; it may say anything, so only known words are passed on. */
export const clientWords = (userAgent: string | null): string => {
  const agent = userAgent ?? ''
  const browser = named(
    [
      [/Edg\//, 'Edge'],
      [/Firefox\//, 'Firefox'],
      [/Chrom(e|ium)\//, 'Chrome'],
      [/Safari\//, 'Safari'],
    ],
    agent,
  )
  const system = named(
    [
      [/Windows/, 'Windows'],
      [/Android/, 'Android'],
      [/iPhone|iPad/, 'iOS'],
      [/Mac OS/, 'macOS'],
      [/Linux/, 'Linux'],
    ],
    agent,
  )
  return browser ? `${browser}${system ? ` on ${system}` : ''}` : 'another program'
}

/** Where the person is signed in; without the secrets of the sessions, which leave the server in a cookie only. */
export async function ownSessions(
  actor: Actor,
  currentToken: string,
  db: Database = database(),
): Promise<SessionLine[]> {
  const rows = await db.session.findMany({
    where: { userId: actor.userId, expiresAt: { gt: now() } },
    orderBy: { createdAt: 'desc' },
  })
  return rows.map(({ id, token, userAgent, ipAddress, createdAt, updatedAt }) => ({
    sessionId: id,
    client: clientWords(userAgent),
    ipAddress: ipAddress || null,
    since: createdAt.toISOString(),
    lastUsed: updatedAt.toISOString(),
    here: token === currentToken,
  }))
}

const toEnd = z.object({ sessionId: idInput.nullable() })

/**
 * Ends one of the person's sessions, or with null every one but the present.
 * @throws DomainError `not-found` for a session that is over or somebody else's
 */
export async function endSession(
  actor: Actor,
  currentToken: string,
  input: z.input<typeof toEnd>,
  db: Database = database(),
): Promise<{ ended: number }> {
  const { sessionId } = parseInput(toEnd, input)
  const { count } = await db.session.deleteMany({
    where: { userId: actor.userId, ...(sessionId === null ? { token: { not: currentToken } } : { id: sessionId }) },
  })
  if (count === 0 && sessionId !== null) throw new DomainError('not-found', 'This session has ended already.')
  if (count > 0) await recordOfPerson(db, actor.userId, 'sessions-ended', { count })
  return { ended: count }
}
