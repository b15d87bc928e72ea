import { joinTestCluster } from '@/lib/start/testing/cluster.mjs'
import { copyTemplate, ensureTemplate } from '@/lib/start/testing/template.mjs'

/** A database of one test file: migrated, empty, with the queues made. */
export interface FreshDatabase {
  /** Address for the application's plain role. */
  url: string
  /** Removes it, cutting off whoever is still connected. */
  drop(): Promise<void>
}

let prepared: Promise<{ server: string; template: string }> | undefined

/** The server is started by the first test file that asks; `test/support/stop-cluster.ts` leaves it when all have ended. */
async function prepare(): Promise<{ server: string; template: string }> {
  const server = process.env.TEST_CLUSTER_URL ?? (await joinTestCluster()).ownerUrl('postgres')
  return { server, template: await ensureTemplate(server) }
}

/** Copies the template database; a test never touches the database in a user's `DATABASE_URL`. */
export async function freshDatabase(): Promise<FreshDatabase> {
  prepared ??= prepare()
  const { server, template } = await prepared
  return copyTemplate(server, template)
}
