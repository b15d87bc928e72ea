import type { StudyResult } from '../engine/study-run'
import type { StudyDocument } from '../study/document/study-document'
import type { ProgressListener } from '../study/run-document'
import { refusalError } from './compute-outcome'
import type { BrowserMessage, ComputeTask } from './messages'

/**
 * Computes a study in a thread of this browser with the same engine as the server. Refused as `runDocument` refuses;
 * rejected when the thread cannot be started or fails; ended at once when the signal aborts.
 */
export function computeStudyInBrowser(
  document: StudyDocument,
  { onProgress, signal }: { onProgress?: ProgressListener; signal?: AbortSignal } = {},
): Promise<StudyResult> {
  return new Promise((resolve, reject) => {
    if (signal?.aborted) return reject(signal.reason)
    const thread = new Worker(new URL('./browser.worker.ts', import.meta.url), { type: 'module' })
    const end = (settle: () => void) => {
      thread.terminate()
      settle()
    }
    signal?.addEventListener('abort', () => end(() => reject(signal.reason)), { once: true })
    thread.addEventListener('error', ({ message }) => end(() => reject(new Error(message))))
    thread.addEventListener('message', ({ data }: MessageEvent<BrowserMessage>) => {
      if (data.kind === 'progress') onProgress?.(data.done, data.of)
      else if (data.kind === 'computed') end(() => resolve(data.result))
      else if (data.kind === 'refused') end(() => reject(refusalError(data.refusal)))
      else end(() => reject(new Error(data.message)))
    })
    const task: ComputeTask = { document }
    thread.postMessage(task)
  })
}
