'use client'

import { useRef, useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Notice } from '@/lib/ui/notice'
import { ProgressBar } from '@/lib/ui/progress-bar'
import type { Comparison } from './compare-results'
import { ComparisonView } from './comparison-view'

type State =
  | { is: 'idle' }
  | { is: 'computing'; done: number; of: number }
  | { is: 'refused'; message: string }
  | { is: 'compared'; comparison: Comparison }

/** Computes the attached study anew in the visitor's own browser and holds the result against the one attached to the report. */
export function RecomputeSlot({ study, results }: { study: string; results: string | null }) {
  const [state, setState] = useState<State>({ is: 'idle' })
  const stopping = useRef<AbortController>(null)
  const compute = async () => {
    setState({ is: 'computing', done: 0, of: 0 })
    stopping.current = new AbortController()
    const onProgress = (done: number, of: number) => setState({ is: 'computing', done, of })
    // The engine and the reader of study files are fetched only by those who ask for them.
    const { recomputeStudy } = await import('./recompute-study')
    const outcome = await recomputeStudy(study, results, { onProgress, signal: stopping.current.signal })
    setState(
      outcome.ok ? { is: 'compared', comparison: outcome.value } : { is: 'refused', message: outcome.error.message },
    )
  }
  return (
    <section aria-labelledby="recompute" className="grid gap-2">
      <h2 id="recompute" className="m-0 text-body font-semibold">
        Study inside the report
      </h2>
      <p className="m-0 max-w-2xl text-soft">
        The report carries the data that it was computed from. Your browser can compute the study again from these data
        alone, with the same method, and compare every number with the report’s own. Nothing is sent anywhere.
      </p>
      {state.is === 'computing' ? (
        <div className="grid max-w-md gap-2">
          <ProgressBar
            label={
              state.of === 0
                ? 'Reading the study'
                : `Computing case ${Math.min(state.done + 1, state.of)} of ${state.of}`
            }
            done={state.done}
            of={state.of}
          />
          <div>
            <Button onClick={() => stopping.current?.abort(new Error('stopped by the reader'))}>Stop computing</Button>
          </div>
        </div>
      ) : (
        <div>
          <Button onClick={() => void compute()}>Recompute in this browser</Button>
        </div>
      )}
      {state.is === 'refused' ? <Notice tone="bad">{state.message}</Notice> : null}
      {state.is === 'compared' ? <ComparisonView comparison={state.comparison} /> : null}
    </section>
  )
}
