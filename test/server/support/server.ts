import { afterAll, beforeAll } from 'vitest'
import { database } from '@/lib/server/db'
import { sendingBoss } from '@/lib/server/jobs/boss'
import { type FreshDatabase, freshDatabase } from '../../support/database'

/** The server's own modules on a database of this test file, with secrets of its own. */
export function useServer(): { url: () => string } {
  let fresh: FreshDatabase | undefined
  beforeAll(async () => {
    fresh = await freshDatabase()
    Object.assign(process.env, {
      DATABASE_URL: fresh.url,
      BETTER_AUTH_SECRET: 'a secret of the tests and of nothing else',
      CA_WRAP_SECRET: 'another secret of the tests, for the authority',
      BASE_URL: 'http://127.0.0.1:3000',
    })
  })
  afterAll(async () => {
    await (await sendingBoss()).stop({ graceful: false, wait: true })
    await database().$disconnect()
    await fresh?.drop()
  })
  return { url: () => process.env.DATABASE_URL ?? '' }
}
