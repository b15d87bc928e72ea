import type PgBoss from 'pg-boss'

/** How a queue treats its jobs: how often one is tried again, and after how many seconds without an end it counts as lost. */
export type QueueSettings = Required<
  Pick<PgBoss.Queue, 'retryLimit' | 'retryDelay' | 'retryBackoff' | 'expireInSeconds'>
>

/**
 * Every queue of the application. They are made before the first process starts, under one lock: made by several processes
 * at once they deadlock.
 */
export const queues = {
  /** Cases of a study, computed in a thread of the worker. */
  compute: { retryLimit: 2, retryDelay: 2, retryBackoff: true, expireInSeconds: 300 },
  /** The PDF of a revision. */
  render: { retryLimit: 2, retryDelay: 2, retryBackoff: true, expireInSeconds: 300 },
} as const satisfies Record<string, QueueSettings>

export type QueueName = keyof typeof queues
