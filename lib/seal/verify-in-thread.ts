import { Worker } from 'node:worker_threads'
import { DomainError } from '@/lib/errors'
import type { CheckedUpload } from './checked-upload'
import type { VerificationContext } from './verification-context'
import { verificationLimits } from './verification-limits'
import type { VerifyTask } from './verify.worker'

/** How a check is run: the built entry of the thread, the time and the memory it may take. */
export interface ThreadOptions {
  /** The bundle of `verify.worker.ts`. */
  readonly entry: string | URL
  readonly milliseconds?: number
  readonly heapMegabytes?: number
}

const atOnce = 2
const waitingAtMost = 16
let running = 0
const waiting: (() => void)[] = []

/**
 * Checks an uploaded file in a thread of its own, so that no file can hold up or bring down the server: at most two at a time, within 10 s
 * and 512 MB each. Refused: `too-large` beyond 20 MB or beyond time or memory, `too-many` while too many files wait.
 */
export async function verifyInThread(
  bytes: Uint8Array,
  context: VerificationContext,
  options: ThreadOptions,
): Promise<CheckedUpload> {
  if (bytes.length > verificationLimits.bytes)
    throw new DomainError('too-large', 'The file is larger than 20 MB: no report is.')
  await enter()
  try {
    return await runThread({ bytes, context }, options)
  } finally {
    leave()
  }
}

async function enter(): Promise<void> {
  if (running < atOnce) {
    running += 1
    return
  }
  if (waiting.length >= waitingAtMost) {
    throw new DomainError('too-many', 'Many files are being checked at this moment: try again in a minute.')
  }
  await new Promise<void>((resolve) => waiting.push(resolve))
}

/** Hands the place on to the next in line, or gives it back. */
function leave(): void {
  const next = waiting.shift()
  if (next) next()
  else running -= 1
}

function runThread(task: VerifyTask, options: ThreadOptions): Promise<CheckedUpload> {
  const {
    entry,
    milliseconds = verificationLimits.milliseconds,
    heapMegabytes = verificationLimits.heapMegabytes,
  } = options
  return new Promise((resolve, reject) => {
    const thread = new Worker(entry, { workerData: task, resourceLimits: { maxOldGenerationSizeMb: heapMegabytes } })
    const stop = setTimeout(() => {
      reject(new DomainError('too-large', 'The file takes longer to check than any report: it is not checked further.'))
      void thread.terminate()
    }, milliseconds)
    thread.once('message', (checked: CheckedUpload) => resolve(checked))
    thread.once('error', (error: Error & { code?: string }) => {
      const exhausted = error.code === 'ERR_WORKER_OUT_OF_MEMORY'
      reject(
        exhausted
          ? new DomainError(
              'too-large',
              'The file needs more memory to check than any report: it is not checked further.',
            )
          : error,
      )
    })
    thread.once('exit', () => {
      clearTimeout(stop)
      // Settled already, unless the thread ended without a word.
      reject(new Error('the checking thread ended without a result'))
    })
  })
}
