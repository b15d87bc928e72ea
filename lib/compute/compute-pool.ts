import os from 'node:os'
import { Piscina } from 'piscina'
import type { CaseInput } from '../engine/case-input'
import type { CaseResult } from '../engine/case-result'
import { judgeStudy } from '../engine/run-study'
import type { StudyResult } from '../engine/study-run'
import type { StudyDocument } from '../study/document/study-document'
import { studyVerdict } from '../study/study-verdict'
import { bundlePath } from './bundle-path'
import type { ComputeOptions } from './messages'
import type { PreparedStudy } from './node.worker'
import { errorOf } from './refusal'

export interface PoolSettings {
  /** Bundled program of the threads. */
  entry?: string
  threads?: number
  /** Heap of each thread; a case needs a few megabytes. */
  heapMegabytes?: number
}

/** Threads that compute studies, one case a task, so that cases run beside each other and can be stopped. */
export class ComputePool {
  readonly #pool: Piscina

  constructor({ entry = bundlePath('compute'), threads, heapMegabytes = 512 }: PoolSettings = {}) {
    this.#pool = new Piscina({
      filename: entry,
      minThreads: 0,
      maxThreads: threads ?? Math.max(1, Math.min(4, os.availableParallelism())),
      idleTimeout: 10_000,
      resourceLimits: { maxOldGenerationSizeMb: heapMegabytes },
    })
  }

  /** Computes a study; rejects with a DomainError where it is refused, with the signal's reason where it is stopped. */
  async compute(document: StudyDocument, { onProgress, signal }: ComputeOptions = {}): Promise<StudyResult> {
    const stop = new AbortController()
    const passOn = () => stop.abort(signal?.reason)
    if (signal?.aborted) passOn()
    signal?.addEventListener('abort', passOn)
    try {
      return await this.#run(document, onProgress, stop.signal)
    } catch (error) {
      // The first case that fails takes the others with it.
      stop.abort(error)
      throw signal?.aborted ? signal.reason : error
    } finally {
      signal?.removeEventListener('abort', passOn)
    }
  }

  async #run(
    document: StudyDocument,
    onProgress: ComputeOptions['onProgress'],
    signal: AbortSignal,
  ): Promise<StudyResult> {
    const prepared: PreparedStudy = await this.#pool.run(document, { name: 'prepareStudyTask', signal })
    if (prepared.kind !== 'prepared') throw errorOf(prepared)
    const { input } = prepared
    let done = 0
    const computeCase = async (each: CaseInput): Promise<CaseResult> => {
      const result: CaseResult = await this.#pool.run(each, { name: 'computeCaseTask', signal })
      done += 1
      onProgress?.(done, input.cases.length)
      return result
    }
    const judged = judgeStudy(input, await Promise.all(input.cases.map(computeCase)))
    return { ...judged, overall: studyVerdict(document, judged.verdicts) }
  }

  /** Ends all threads; what they were computing is rejected. */
  close(): Promise<void> {
    return this.#pool.destroy()
  }
}
