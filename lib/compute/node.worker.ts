import type { MessagePort } from 'node:worker_threads'
import { computeOutcome } from './compute-outcome'
import type { ComputeOutcome, ComputeProgress, ComputeTask } from './messages'

/** A task with the port on which its progress is told. */
export interface ThreadTask extends ComputeTask {
  port: MessagePort
}

/** The task of a computing thread of a server or of the command line. */
export function compute({ document, port }: ThreadTask): ComputeOutcome {
  const tell = (done: number, of: number) => {
    const progress: ComputeProgress = { done, of }
    port.postMessage(progress)
  }
  try {
    return computeOutcome({ document }, tell)
  } finally {
    port.close()
  }
}
