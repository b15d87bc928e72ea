/** How far the computation of a study has come, as the server says it. */
export interface Progress {
  state: 'none' | 'queued' | 'running' | 'done' | 'failed' | 'stopped'
  runId: string | null
  done: number
  of: number
  failure: string | null
}

export const isOpen = ({ state }: Progress): boolean => state === 'queued' || state === 'running'
