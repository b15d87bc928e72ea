import 'server-only'
import { appendEvents, lockHead } from '../audit'
import { now } from '../clock'
import type { Database } from '../db'
import { enterEach } from '../enter'

/** What a person did to their own account. */
export type AccountEvent =
  | 'signed-in'
  | 'password-changed'
  | 'password-reset'
  | 'second-factor-set'
  | 'second-factor-removed'
  | 'recovery-codes-made'
  | 'sessions-ended'

/** Writes what concerns a person's account into the chain of each of their organisations. */
export async function recordOfPerson(
  db: Database,
  userId: string,
  action: AccountEvent,
  payload: Record<string, unknown> = {},
): Promise<void> {
  await db.$transaction(async (tx) => {
    const { name, email } = await tx.user.findUniqueOrThrow({ where: { id: userId } })
    const at = now()
    await enterEach(tx, { userId, name, email }, async (organisationId) => {
      const head = await lockHead(tx, organisationId, null)
      const subject = { kind: 'person', id: userId }
      await appendEvents(tx, head, { userId, name }, at, [{ action, subject, payload }])
    })
  })
}
