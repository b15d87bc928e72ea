import crypto from 'node:crypto'
import fs from 'node:fs'
import path from 'node:path'
import { onTestFinished } from 'vitest'
import { readPostmaster, stopPostmaster } from '@/lib/start/embedded/postmaster.mjs'
import { type Cluster, startCluster } from '@/lib/start/embedded/server.mjs'
import { inRoot } from '@/lib/start/root.mjs'

/** The data folder of a server for one test, which is stopped and removed afterwards in whatever state it is. */
export function ownClusterFolder(): string {
  const folder = inRoot('.data', 'test', `own-${crypto.randomUUID()}`)
  const dataDir = path.join(folder, 'pg')
  onTestFinished(async () => {
    const running = readPostmaster(dataDir)
    if (running) await stopPostmaster(running.pid)
    fs.rmSync(folder, { recursive: true, force: true })
  })
  return dataDir
}

/** A server of its own for one test, with the settings that people get. */
export const ownCluster = (): Promise<Cluster> => startCluster({ dataDir: ownClusterFolder() })
