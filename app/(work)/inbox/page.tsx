import type { Metadata } from 'next'
import Link from 'next/link'
import { ask } from '@/app/_action/ask'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { type InboxLine, myInbox } from '@/lib/server/reviews/queries'
import { DataTable } from '@/lib/ui/data-table'
import { EmptyState } from '@/lib/ui/empty-state'
import { Moment } from '@/lib/ui/moment'

export const metadata: Metadata = { title: 'Inbox' }

const kindWords: Record<string, string> = {
  mention: 'named you in',
  assigned: 'handed you',
  reply: 'replied to',
  answer: 'answered',
}

export default async function InboxPage() {
  const lines = await ask(myInbox, {})
  return (
    <WorkFrame path={[{ label: 'Projects', href: '/projects' }, { label: 'Inbox' }]}>
      <div className="flex flex-col gap-3">
        <h1 className="m-0 text-title font-semibold">Inbox</h1>
        {lines.length === 0 ? (
          <EmptyState title="Nothing waits for you.">
            Comments that name you, are handed to you or answer yours arrive here; opening their revision marks them as
            read.
          </EmptyState>
        ) : (
          <DataTable<InboxLine>
            caption="Inbox, newest first"
            rows={lines}
            rowId={({ noticeId }) => noticeId}
            columns={[
              {
                id: 'comment',
                label: 'What',
                cell: ({ by, kind, comment, studyId, revisionId, read }) => (
                  <span className={read ? 'font-normal' : undefined}>
                    {read ? '' : 'new: '}
                    {by} {kindWords[kind] ?? 'wrote'}{' '}
                    <Link
                      prefetch={false}
                      className="link"
                      href={`/studies/${studyId}/revisions/${revisionId}#comment-${comment}`}
                    >
                      comment {comment}
                    </Link>
                  </span>
                ),
              },
              { id: 'excerpt', label: 'Text', cell: ({ excerpt }) => excerpt || '–' },
              { id: 'study', label: 'Study', cell: ({ title }) => title },
              { id: 'at', label: 'At', cell: ({ at }) => <Moment at={at} /> },
            ]}
          />
        )}
      </div>
    </WorkFrame>
  )
}
