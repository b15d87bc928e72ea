import 'server-only'
import PgBoss from 'pg-boss'

/** The schema of the queue's own tables, beside the application's. */
export const queueSchema = 'pgboss'

/**
 * What a process does with the queue: `send` puts jobs in, `work` carries them out and looks after expired ones, `install`
 * makes the tables and queues.
 */
export type QueuePurpose = 'send' | 'work' | 'install'

/**
 * Connections a process holds for the queue. With the pool of the records (10) and the listening connection, two web and
 * two worker processes stay under the embedded server's 100.
 */
const connections: Record<QueuePurpose, number> = { send: 2, work: 4, install: 1 }

/**
 * Connects to the queue. A lost connection is reported and retried by the engine itself.
 * @throws when the server cannot be reached at the start, or the tables are missing (purposes other than `install`)
 */
export async function openBoss(databaseUrl: string, purpose: QueuePurpose): Promise<PgBoss> {
  const boss = new PgBoss({
    connectionString: databaseUrl,
    schema: queueSchema,
    application_name: `breakaway-queue-${purpose}`,
    max: connections[purpose],
    migrate: purpose === 'install',
    supervise: purpose === 'work',
    schedule: false,
    // a job of a killed worker is found lost this many seconds after its time has run out, at the latest
    ...(purpose === 'work' ? { maintenanceIntervalSeconds: 5, monitorStateIntervalSeconds: 30 } : {}),
  })
  boss.on('error', (error) => process.stderr.write(`queue: ${error.message}\n`))
  await boss.start()
  return boss
}

const shared = globalThis as typeof globalThis & { breakawayBoss?: Promise<PgBoss> }

/** The one sending connection of this process, opened when it is first needed and again after a failure. */
export function sendingBoss(): Promise<PgBoss> {
  shared.breakawayBoss ??= openBoss(process.env.DATABASE_URL ?? '', 'send').catch((error) => {
    delete shared.breakawayBoss
    throw error
  })
  return shared.breakawayBoss
}
