import type { Metadata } from 'next'
import Link from 'next/link'
import { seek } from '@/app/_action/ask'
import { caseResult } from '@/app/(work)/_results/results'
import { caseToOpen, ResultsView } from '@/app/(work)/_results/results-view'
import { caseSeries } from '@/lib/server/studies/queries'
import { EmptyState } from '@/lib/ui/empty-state'
import { Notice } from '@/lib/ui/notice'
import { StudyComputation } from '../_computing/study-computation'
import { studyOf } from '../study'

export const metadata: Metadata = { title: 'Results' }

export default async function ResultsPage({ params, searchParams }: PageProps<'/studies/[studyId]/results'>) {
  const { studyId } = await params
  const study = await studyOf(studyId)
  const { document, run } = study
  const results = document && run.result ? { document, summary: run.result } : null
  const caseId = results ? caseToOpen(results, (await searchParams).case) : ''
  const series = results && caseResult(results, caseId) ? await seek(caseSeries, { studyId, caseId }) : null
  return (
    <div className="flex flex-col gap-5">
      <div className="flex flex-col gap-2">
        <h1 className="m-0 text-title font-semibold">Results</h1>
        <StudyComputation study={study} />
      </div>
      {run.result === null ? (
        <EmptyState title="Nothing has been computed yet.">
          Press “Compute cases” above; with no cases yet,{' '}
          <Link prefetch={false} className="link" href={`/studies/${studyId}/cases`}>
            add the first one
          </Link>
          .
        </EmptyState>
      ) : null}
      {run.result && !document ? (
        <Notice tone="caution">
          The records no longer fit together, so the results of the last computation cannot be shown against them.
          Correct what is listed above and compute again.
        </Notice>
      ) : null}
      {results ? <ResultsView results={results} caseId={caseId} series={series} /> : null}
    </div>
  )
}
