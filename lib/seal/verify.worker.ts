import { parentPort, workerData } from 'node:worker_threads'
import { checkUpload } from './checked-upload'
import type { VerificationContext } from './verification-context'

/** What the thread is started with. */
export interface VerifyTask {
  readonly bytes: Uint8Array
  readonly context: VerificationContext
}

const { bytes, context } = workerData as VerifyTask
parentPort?.postMessage(checkUpload(bytes, context))
