import { expect, onTestFinished, test } from 'vitest'
import { installQueues } from '@/lib/server/console/queues'
import { openBoss } from '@/lib/server/jobs/boss'
import { queues } from '@/lib/server/jobs/queues'
import { withClient } from '@/lib/start/embedded/owner.mjs'
import { freshDatabase } from '../support/database'

async function ownDatabase(): Promise<string> {
  const { url, drop } = await freshDatabase()
  onTestFinished(drop)
  return url
}

test('four processes that make the queues at once do not stop each other', async () => {
  const url = await ownDatabase()
  await withClient(url, (client) => client.query('drop schema pgboss cascade'))
  await Promise.all([1, 2, 3, 4].map(() => installQueues(url)))
  const made = await withClient(
    url,
    async (client) => (await client.query('select name from pgboss.queue order by 1')).rows,
  )
  expect(made.map((row) => row.name)).toEqual(Object.keys(queues).sort())
})

test('changed settings of a queue reach a database that has it', async () => {
  const url = await ownDatabase()
  await withClient(url, (client) => client.query('update pgboss.queue set expire_seconds = 1, retry_limit = 0'))
  await installQueues(url)
  const kept = await withClient(
    url,
    async (client) => (await client.query('select name, expire_seconds, retry_limit from pgboss.queue')).rows,
  )
  for (const { name, expire_seconds, retry_limit } of kept) {
    const settings = Object.entries(queues).find(([known]) => known === name)?.[1]
    expect({ expire_seconds, retry_limit }).toEqual({
      expire_seconds: settings?.expireInSeconds,
      retry_limit: settings?.retryLimit,
    })
  }
})

test('a job sent by one connection is carried out by another', async () => {
  const url = await ownDatabase()
  const sender = await openBoss(url, 'send')
  const worker = await openBoss(url, 'work')
  const name = Object.keys(queues)[0] ?? ''
  const arrived = new Promise((resolve) => {
    void worker.work(name, { pollingIntervalSeconds: 0.5 }, async ([job]) => resolve(job?.data))
  })
  await sender.send(name, { id: 'a' })
  expect(await arrived).toEqual({ id: 'a' })
  await worker.stop({ graceful: true, timeout: 2000, wait: true })
  await sender.stop({ graceful: false, wait: true })
})
