// @ts-check
// Starts (or finds) the embedded database of the data folder for development and prints its address, alone on a line.

import { ensureDatabase } from './embedded/owner.mjs'
import { startCluster } from './embedded/server.mjs'
import { runCommand } from './failure.mjs'
import { inRoot } from './root.mjs'

await runCommand(async () => {
  const [name = 'development'] = process.argv.slice(2)
  const cluster = await startCluster({ dataDir: inRoot('.data', 'development', 'pg'), createDatabases: true })
  if (name === '--stop') {
    await cluster.stop()
    return
  }
  await ensureDatabase(cluster, name)
  process.stdout.write(`${cluster.ownerUrl(name)}\n`)
})
process.exit()
