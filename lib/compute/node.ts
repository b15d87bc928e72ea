import { MessageChannel } from 'node:worker_threads'
import type { StudyResult } from '../engine/study-run'
import type { StudyDocument } from '../study/document/study-document'
import type { ProgressListener } from '../study/run-document'
import { refusalError } from './compute-outcome'
import type { ComputeOutcome, ComputeProgress } from './messages'
import { runInThread } from './thread-pool'

export interface ComputeOptions {
  /** Path of the bundled `node.worker.ts`. */
  entry: string
  onProgress?: ProgressListener
  /** Aborting it ends the computation at once. */
  signal?: AbortSignal
  /** Default 240 s. */
  milliseconds?: number
}

/**
 * Computes a study in a thread of this process. Refused as `runDocument` refuses, and `too-large` beyond the budget,
 * `wrong-state` when stopped.
 */
export async function computeStudy(document: StudyDocument, options: ComputeOptions): Promise<StudyResult> {
  const { port1, port2 } = new MessageChannel()
  port1.on('message', ({ done, of }: ComputeProgress) => options.onProgress?.(done, of))
  try {
    const outcome = await runInThread<ComputeOutcome>(
      { document, port: port2 },
      {
        entry: options.entry,
        name: 'compute',
        milliseconds: options.milliseconds ?? 240_000,
        heapMegabytes: 1024,
        signal: options.signal,
      },
      [port2],
    )
    if (outcome.kind === 'refused') throw refusalError(outcome.refusal)
    return outcome.result
  } finally {
    port1.close()
  }
}
