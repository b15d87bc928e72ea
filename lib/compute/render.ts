import type { ReportInput } from '../report/report-input'
import type { RenderedReport } from './render.worker'
import { runInThread } from './thread-pool'

export interface RenderOptions {
  /** Path of the bundled `render.worker.ts`. */
  entry: string
  signal?: AbortSignal
  /** Default 240 s: a layout that does not end is ended here. */
  milliseconds?: number
}

/** Renders a report in a thread of this process, so that neither a request nor a page waits for it. */
export const renderReport = (input: ReportInput, options: RenderOptions): Promise<RenderedReport> =>
  runInThread<RenderedReport>(input, {
    entry: options.entry,
    name: 'render',
    milliseconds: options.milliseconds ?? 240_000,
    heapMegabytes: 900,
    signal: options.signal,
  })
