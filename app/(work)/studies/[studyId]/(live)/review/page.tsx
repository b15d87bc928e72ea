import type { Metadata } from 'next'
import Link from 'next/link'
import { stateWords } from '@/app/_words/state-words'
import { FreezeRevision } from '@/app/(work)/_review/freeze-revision'
import { DataTable } from '@/lib/ui/data-table'
import { EmptyState } from '@/lib/ui/empty-state'
import { Moment } from '@/lib/ui/moment'
import { Notice } from '@/lib/ui/notice'
import { studyOf } from '../study'

export const metadata: Metadata = { title: 'Review' }

export default async function ReviewPage({ params }: PageProps<'/studies/[studyId]/review'>) {
  const { studyId } = await params
  const { revisions, run, may, problems } = await studyOf(studyId)
  const ready = run.result !== null && !run.stale && problems.length === 0
  return (
    <div className="flex flex-col gap-4">
      <div className="flex flex-wrap items-center justify-between gap-2">
        <h1 className="m-0 text-title font-semibold">Review</h1>
        {revisions.length > 1 ? (
          <Link prefetch={false} href={`/studies/${studyId}/revisions/compare`} className="link">
            Compare revisions
          </Link>
        ) : null}
        {may.freeze && ready ? <FreezeRevision studyId={studyId} /> : null}
      </div>
      {may.freeze && !ready ? (
        <Notice>
          A revision freezes records together with the results that belong to them:{' '}
          <Link prefetch={false} href={`/studies/${studyId}/cases`} className="link">
            compute the cases
          </Link>{' '}
          as the records stand now, then freeze.
        </Notice>
      ) : null}
      {revisions.length === 0 ? (
        <EmptyState title="No revision yet.">
          A revision is a frozen copy that is checked, reviewed, signed and issued; the live records go on changing.
        </EmptyState>
      ) : (
        <DataTable
          caption="Revisions"
          rows={revisions}
          rowId={({ revisionId }) => revisionId}
          columns={[
            {
              id: 'number',
              label: 'Revision',
              cell: ({ revisionId, number, attempt }) => (
                <Link prefetch={false} href={`/studies/${studyId}/revisions/${revisionId}`} className="link">
                  Revision {number}
                  {attempt > 1 ? `, attempt ${attempt}` : ''}
                </Link>
              ),
            },
            { id: 'state', label: 'State', cell: ({ state }) => stateWords[state] },
            { id: 'purpose', label: 'Purpose', cell: ({ purpose }) => purpose ?? 'not set' },
            { id: 'by', label: 'Frozen by', cell: ({ frozenBy }) => frozenBy },
            { id: 'at', label: 'Frozen', cell: ({ frozenAt }) => <Moment at={frozenAt} /> },
          ]}
        />
      )}
    </div>
  )
}
