import { computeStudyInBrowser } from '@/lib/compute/browser'
import { DomainError, type Result } from '@/lib/errors'
import { readStudy } from '@/lib/study/read/read-study'
import type { ProgressListener } from '@/lib/study/run-document'
import { type Comparison, compareResults } from './compare-results'

const noResults = 'The report carries no results to compare with: ask for the report as issued.'
const stopped = 'Stopped: nothing was compared.'
const failed = 'The study could not be computed in this browser: load the page again, or try another browser.'

/** Reads an attached study, computes it in a thread of this browser, and compares it with the attached results. */
export async function recomputeStudy(
  study: string,
  results: string | null,
  run: { onProgress: ProgressListener; signal: AbortSignal },
): Promise<Result<Comparison>> {
  const read = readStudy(study)
  if (!read.ok) return read
  const attached = results === null ? undefined : parse(results)
  if (attached === undefined) return { ok: false, error: new DomainError('invalid', noResults) }
  try {
    run.signal.throwIfAborted()
    return { ok: true, value: compareResults(attached, await computeStudyInBrowser(read.value, run)) }
  } catch (error) {
    if (run.signal.aborted) return { ok: false, error: new DomainError('unavailable', stopped) }
    return { ok: false, error: error instanceof DomainError ? error : new DomainError('unavailable', failed) }
  }
}

function parse(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return undefined
  }
}
