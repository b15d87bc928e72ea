import fs from 'node:fs'
import { inRoot } from '@/lib/start/root.mjs'
import { joinTestCluster, leaveTestCluster } from '@/lib/start/testing/cluster.mjs'

/** For the whole run: no user's database can be reached by accident, and a server that the run started is left at its end. */
export default function setup(): (() => Promise<void>) | undefined {
  delete process.env.DATABASE_URL
  if (process.env.TEST_CLUSTER_URL) return undefined
  return async () => {
    if (fs.existsSync(inRoot('.data', 'test', 'leases', `${process.pid}.json`))) {
      await leaveTestCluster(await joinTestCluster())
    }
  }
}
