import path from 'node:path'
import { computeStudy } from '@/lib/compute/node'
import { renderReport } from '@/lib/compute/render'
import { closeThreads } from '@/lib/compute/thread-pool'
import { database } from '../db'
import { env } from '../env'
import { startWork } from './work'

/** A worker process: takes jobs until it is told to stop, and gives back what it has not finished. */
const { DATABASE_URL, JOBS_DIR } = env()
const programs = path.resolve(JOBS_DIR)

const work = await startWork(DATABASE_URL, database(), {
  compute: (document, options) => computeStudy(document, { entry: path.join(programs, 'compute.js'), ...options }),
  render: (input, options) => renderReport(input, { entry: path.join(programs, 'render.js'), ...options }),
})
process.stdout.write('worker ready\n')

let stopping = false

async function stop(): Promise<void> {
  if (stopping) return
  stopping = true
  await work.stop()
  await closeThreads()
  await database().$disconnect()
  process.exit()
}

for (const signal of ['SIGTERM', 'SIGINT'] as const) process.on(signal, () => void stop())
