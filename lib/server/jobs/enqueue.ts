import 'server-only'
import type { Tx } from '../db'
import { sendingBoss } from './boss'
import type { QueueName } from './queues'

/** What a job carries: identities only, so that nothing confidential lies in the queue's tables. */
export interface JobIds {
  compute: { organisationId: string; runId: string }
  render: { organisationId: string; reportId: string }
}

/** Channel on which waiting workers are woken. */
export const jobChannel = 'breakaway_job'

/** Puts a job into the queue within the transaction: it is there if, and only if, the transaction is. */
export async function enqueue<Name extends QueueName & keyof JobIds>(
  tx: Tx,
  queue: Name,
  ids: JobIds[Name],
): Promise<void> {
  const boss = await sendingBoss()
  const executeSql = async (text: string, values: unknown[]) => ({
    rows: await tx.$queryRawUnsafe<unknown[]>(text, ...values),
  })
  const jobId = await boss.send(queue, ids, { db: { executeSql } })
  if (!jobId) throw new Error(`the queue ${queue} took no job`)
  await tx.$executeRaw`select pg_notify(${jobChannel}, ${queue})`
}
