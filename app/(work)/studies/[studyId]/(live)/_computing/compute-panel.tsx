'use client'

import Link from 'next/link'
import { useState } from 'react'
import { answered, type Outcome } from '@/app/_action/outcome'
import { Button } from '@/lib/ui/button'
import { Notice } from '@/lib/ui/notice'
import { ProgressBar } from '@/lib/ui/progress-bar'
import { computeCases, stopCases } from './actions'
import type { Progress } from './progress'
import { useProgress } from './use-progress'

interface ComputePanelProps {
  studyId: string
  given: Progress
  /** The person may compute. */
  allowed: boolean
  /** What keeps the study from being computed. */
  problems: readonly string[]
  caseCount: number
  /** Results there are: none, as the records stand, or of earlier records. */
  results: 'none' | 'current' | 'stale'
  /** Beside the button, on the page of the cases. */
  resultsLink?: boolean
}

const said: Record<ComputePanelProps['results'], string> = {
  none: 'Not computed yet.',
  current: 'Results belong to the records as they stand.',
  stale: 'Records have changed since the last results: compute again.',
}

/** Starts the computation of all cases, shows how far it is, stops it. */
export function ComputePanel(props: ComputePanelProps) {
  const { studyId, given, allowed, problems, caseCount, results, resultsLink } = props
  const { progress, open, look } = useProgress(studyId, given)
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<string | null>(null)
  const run = async (action: (studyId: string) => Promise<Outcome<unknown>>) => {
    setBusy(true)
    const outcome = await answered(() => action(studyId))
    setRefusal(outcome.ok ? null : outcome.message)
    await look()
    setBusy(false)
  }
  const doing =
    progress.state === 'queued' ? 'Waiting for its turn' : `Computing: ${progress.done} of ${progress.of} cases done`

  return (
    <section aria-label="Computation" className="flex flex-col gap-2">
      {open ? (
        <div className="flex items-end gap-3 border border-hair bg-sheet px-3 py-2">
          <div className="flex-1">
            <ProgressBar label={doing} done={progress.done} of={progress.of} />
          </div>
          {allowed ? (
            <Button busy={busy} onClick={() => void run(stopCases)}>
              Stop computing
            </Button>
          ) : null}
        </div>
      ) : (
        <div className="flex flex-wrap items-center gap-3">
          {allowed ? (
            <Button
              tone={results === 'current' ? 'plain' : 'main'}
              busy={busy}
              disabled={problems.length > 0 || caseCount === 0}
              onClick={() => void run(computeCases)}
            >
              Compute cases
            </Button>
          ) : null}
          <span className={results === 'stale' ? 'text-close' : 'text-soft'}>{said[results]}</span>
          {resultsLink && results !== 'none' ? (
            <Link prefetch={false} className="link" href={`/studies/${studyId}/results`}>
              Open results
            </Link>
          ) : null}
        </div>
      )}
      {!open && progress.state === 'failed' ? (
        <Notice tone="bad">{progress.failure ?? 'The last computation failed: start it again.'}</Notice>
      ) : null}
      {!open && progress.state === 'stopped' ? (
        <Notice>The last computation was stopped before it was done; earlier results, if any, stand.</Notice>
      ) : null}
      {refusal ? <Notice tone="bad">{refusal}</Notice> : null}
      {problems.length > 0 ? (
        <Notice tone="caution">
          <p className="m-0 font-semibold">Before the study can be computed:</p>
          <ul className="m-0 list-disc pl-5">
            {problems.slice(0, 12).map((problem) => (
              <li key={problem}>{problem}</li>
            ))}
          </ul>
          {problems.length > 12 ? <p className="m-0">and {problems.length - 12} more.</p> : null}
        </Notice>
      ) : null}
    </section>
  )
}
