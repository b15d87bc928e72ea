import pg from 'pg'
import { openBoss } from '@/lib/server/jobs/boss'
import { queues } from '@/lib/server/jobs/queues'

/** Any fixed number that nothing else in this database uses as an advisory lock. */
const lockKey = 7_316_402

/**
 * Makes the queue's tables and every queue, or brings their settings up to date. Safe when several processes do it at once.
 * @throws when the database cannot be reached or the role may not make a schema in it
 */
export async function installQueues(databaseUrl: string): Promise<void> {
  const guard = new pg.Client({ connectionString: databaseUrl })
  await guard.connect()
  try {
    await guard.query('select pg_advisory_lock($1)', [lockKey])
    const boss = await openBoss(databaseUrl, 'install')
    try {
      const present = new Set((await boss.getQueues()).map((queue) => queue.name))
      for (const [name, settings] of Object.entries(queues)) {
        if (present.has(name)) await boss.updateQueue(name, { name, ...settings })
        else await boss.createQueue(name, { name, ...settings })
      }
    } finally {
      await boss.stop({ graceful: false, wait: true })
    }
  } finally {
    await guard.end()
  }
}
