import 'server-only'
import { createHash } from 'node:crypto'
import { now } from '../clock'
import type { Database } from '../db'

/** A code of an authenticator app is accepted for about as long as this, so it is remembered for longer. */
const remembered = 3 * 60_000

/**
 * True for the first use of a code by a person, false for every further one: what was watched over a shoulder opens nothing. Two uses
 * at once are told apart by the key of the table.
 */
export async function spendCode(db: Database, userId: string, code: string): Promise<boolean> {
  const at = now()
  const id = createHash('sha256').update(`code used once\0${userId}\0${code}`).digest('hex')
  await db.verification.deleteMany({ where: { id, expiresAt: { lt: at } } })
  const data = { id, identifier: `used-code-${id}`, value: userId, expiresAt: new Date(at.getTime() + remembered) }
  const { count } = await db.verification.createMany({ data: [data], skipDuplicates: true })
  return count === 1
}
