import 'server-only'
import type PgBoss from 'pg-boss'
import type { Database } from '../db'
import { openBoss } from './boss'
import { type ComputeCases, computeStudyJob } from './compute-study'
import { type JobIds, jobChannel } from './enqueue'
import type { JobTry } from './job'
import { type RenderReport, renderReportJob } from './render-report'
import { listenTo } from './wake-up'

/** Where the work is really done. */
export interface Workshop {
  compute: ComputeCases
  render: RenderReport
}

/** How often a queue is looked at besides being woken. Seconds. */
const pollingIntervalSeconds = 2

/** How long jobs may take to give themselves back when the process stops. Milliseconds. */
const patience = 15_000

/**
 * Takes jobs from the queue until it is stopped: woken as soon as one is put in, and looking by itself in case a word was missed.
 * Stopping aborts what runs and gives it back to the queue.
 */
export async function startWork(
  databaseUrl: string,
  db: Database,
  workshop: Workshop,
): Promise<{ stop(): Promise<void> }> {
  const boss = await openBoss(databaseUrl, 'work')
  const stopping = new AbortController()
  const running = new Set<Promise<void>>()
  const take = <Name extends keyof JobIds>(name: Name, handle: (ids: JobIds[Name], how: JobTry) => Promise<void>) =>
    boss.work<JobIds[Name]>(name, { pollingIntervalSeconds, batchSize: 1, includeMetadata: true }, async ([job]) => {
      if (!job) return
      const how = { stopping: stopping.signal, last: job.retryCount >= job.retryLimit }
      const work = handle(job.data, how).catch((error) => report(name, job, error))
      running.add(work)
      await work.finally(() => running.delete(work))
    })
  const workers = {
    compute: await take('compute', (ids, how) => computeStudyJob(db, ids, workshop.compute, how)),
    render: await take('render', (ids, how) => renderReportJob(db, ids, workshop.render, how)),
  }
  const ears = listenTo(databaseUrl, jobChannel, (queue) => {
    if (queue === 'compute' || queue === 'render') boss.notifyWorker(workers[queue])
  })
  return {
    stop: async () => {
      await ears.close()
      stopping.abort()
      await Promise.allSettled(running)
      await boss.stop({ graceful: true, wait: true, timeout: patience })
    },
  }
}

/** Says what broke, by identity only, and lets the queue try again. */
function report(queue: string, job: PgBoss.JobWithMetadata<unknown>, error: unknown): never {
  const text = error instanceof Error ? (error.stack ?? error.message) : String(error)
  process.stderr.write(`${queue} job ${job.id}, try ${job.retryCount + 1}: ${text}\n`)
  throw error
}
