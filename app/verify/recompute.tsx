'use client'

import { useState } from 'react'
import { Button } from '@/lib/ui/button'
import { Notice } from '@/lib/ui/notice'
import type { Comparison } from './compare-results'
import { ComparisonView } from './comparison-view'

type State =
  | { is: 'idle' }
  | { is: 'computing' }
  | { is: 'refused'; message: string }
  | { is: 'compared'; comparison: Comparison }

/** Computes the attached study anew in the visitor's own browser and holds the result against the one attached to the report. */
export function RecomputeSlot({ study, results }: { study: string; results: string | null }) {
  const [state, setState] = useState<State>({ is: 'idle' })
  const compute = async () => {
    setState({ is: 'computing' })
    // The engine and the reader of study files are fetched only by those who ask for them.
    const { recomputeStudy } = await import('./recompute-study')
    const outcome = await recomputeStudy(study, results)
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
      <div>
        <Button tone="plain" busy={state.is === 'computing'} onClick={() => void compute()}>
          {state.is === 'computing' ? 'Computing…' : 'Recompute in this browser'}
        </Button>
      </div>
      {state.is === 'refused' ? <Notice tone="bad">{state.message}</Notice> : null}
      {state.is === 'compared' ? <ComparisonView comparison={state.comparison} /> : null}
    </section>
  )
}
