import type { MessagePort } from 'node:worker_threads'
import { Piscina } from 'piscina'
import { DomainError } from '../errors'

/** How a piece of work is carried out: the bundle of its thread, the time and the memory that it may take, and a way to stop it. */
export interface ThreadBudget {
  /** Path of the bundled thread entry. */
  entry: string
  /** The function of that entry which carries the task out. */
  name: string
  milliseconds: number
  heapMegabytes: number
  signal?: AbortSignal
}

const pools = new Map<string, Piscina>()

/** One thread an entry, kept warm for a while: these jobs fill a core, and a process takes one at a time. */
function poolOf(entry: string, heapMegabytes: number): Piscina {
  const known = pools.get(entry)
  if (known) return known
  const pool = new Piscina({
    filename: entry,
    minThreads: 0,
    maxThreads: 1,
    idleTimeout: 30_000,
    resourceLimits: { maxOldGenerationSizeMb: heapMegabytes },
  })
  pools.set(entry, pool)
  return pool
}

const tooLong = 'The work took longer than it may: divide the study into fewer cases, then try again.'
const tooLarge = 'The work needed more memory than it may take: divide the study into fewer cases, then try again.'
const stopped = 'Stopped before the end.'

/**
 * Runs a task in a thread of its own within a budget. Refused: `too-large` beyond time or memory, `wrong-state` when it was
 * stopped by its signal; what the task throws is thrown on.
 */
export async function runInThread<Outcome>(
  task: object,
  budget: ThreadBudget,
  transferList: MessagePort[] = [],
): Promise<Outcome> {
  const deadline = AbortSignal.timeout(budget.milliseconds)
  const signal = budget.signal ? AbortSignal.any([budget.signal, deadline]) : deadline
  try {
    return await poolOf(budget.entry, budget.heapMegabytes).run(task, { name: budget.name, signal, transferList })
  } catch (error) {
    if (budget.signal?.aborted) throw new DomainError('wrong-state', stopped)
    if (deadline.aborted) throw new DomainError('too-large', tooLong)
    if (error instanceof Error && 'code' in error && error.code === 'ERR_WORKER_OUT_OF_MEMORY')
      throw new DomainError('too-large', tooLarge)
    throw error
  }
}

/** Ends the threads, so that the process can end. */
export async function closeThreads(): Promise<void> {
  const open = [...pools.values()]
  pools.clear()
  await Promise.all(open.map((pool) => pool.destroy()))
}
