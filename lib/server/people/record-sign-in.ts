import 'server-only'
import { appendEvents, lockHead } from '../audit'
import { now } from '../clock'
import type { Database } from '../db'
import { enterEach } from '../enter'

/** Writes into the chain of each of the person's organisations that they signed in. */
export async function recordSignIn(db: Database, userId: string, ipAddress: string | null): Promise<void> {
  await db.$transaction(async (tx) => {
    const { name, email } = await tx.user.findUniqueOrThrow({ where: { id: userId } })
    const at = now()
    await enterEach(tx, { userId, name, email }, async (organisationId) => {
      const head = await lockHead(tx, organisationId, null)
      const subject = { kind: 'person', id: userId }
      await appendEvents(tx, head, { userId, name }, at, [{ action: 'signed-in', subject, payload: { ipAddress } }])
    })
  })
}
