import { DomainError } from '../errors'
import { type ProgressListener, runDocument } from '../study/run-document'
import type { ComputeOutcome, ComputeTask, Refusal } from './messages'

/** Computes a study inside a thread; a refusal becomes a value that can cross to the caller, a bug is thrown. */
export function computeOutcome({ document }: ComputeTask, onProgress: ProgressListener): ComputeOutcome {
  try {
    return { kind: 'computed', result: runDocument(document, onProgress) }
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    const { code, message, issues } = error
    return { kind: 'refused', refusal: { code, message, issues } }
  }
}

/** The refusal as the error that it was before it crossed the thread's border. */
export const refusalError = ({ code, message, issues }: Refusal): DomainError => new DomainError(code, message, issues)
