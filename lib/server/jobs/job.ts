/** Thrown into a job's own work when it must end: the process is asked to stop, or the job is somebody else's by now. */
export class JobInterrupted extends Error {
  constructor(readonly reason: 'stopping' | 'taken-over') {
    super(`the job was interrupted (${reason})`)
    this.name = 'JobInterrupted'
  }
}

/** What a job handler is told about its run by the queue. */
export interface JobTry {
  /** Aborted when the process is asked to stop. */
  stopping: AbortSignal
  /** No further try follows if this one fails. */
  last: boolean
}

/** After so long without an end a run or report counts as lost, whatever its row says: all tries of its job have run out by then. */
export const lostAfter = 20 * 60_000
