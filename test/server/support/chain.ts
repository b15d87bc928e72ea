import { chainBreak } from '@/lib/server/chain-break'
import type { Tx } from '@/lib/server/db'
import { enterAsJob } from '@/lib/server/enter'
import { demo } from '@/prisma/seed/seed-demo'

/** The demo project's events in their order, and the head row that names the last of them. */
export async function chainOf(tx: Tx) {
  await enterAsJob(tx, demo.organisationId)
  const events = await tx.auditEvent.findMany({ where: { scope: demo.projectId }, orderBy: { sequence: 'asc' } })
  const head = await tx.project.findFirstOrThrow({ where: { id: demo.projectId } })
  return { events, head }
}

/** Where the demo project's chain breaks: the first sequence that does not follow from what stands before it; null if it holds. */
export async function breakOf(tx: Tx): Promise<number | null> {
  const { events, head } = await chainOf(tx)
  return chainBreak(events, head)
}
