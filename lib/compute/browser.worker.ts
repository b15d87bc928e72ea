import { computeOutcome } from './compute-outcome'
import type { BrowserMessage, ComputeTask } from './messages'

/** The thread of a browser: one task, then it is ended by the page. */
const say = (message: BrowserMessage) => self.postMessage(message)

self.addEventListener('message', ({ data }: MessageEvent<ComputeTask>) => {
  try {
    say(computeOutcome(data, (done, of) => say({ kind: 'progress', done, of })))
  } catch (error) {
    say({ kind: 'failed', message: error instanceof Error ? error.message : String(error) })
  }
})
