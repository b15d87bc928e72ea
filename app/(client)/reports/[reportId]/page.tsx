import type { Metadata } from 'next'
import { ask } from '@/app/_action/ask'
import { signOffWords } from '@/app/_words/state-words'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { governingSentence } from '@/app/(work)/_results/answer-facts'
import { Cautions } from '@/app/(work)/_results/cautions'
import { ReportFile } from '@/app/(work)/_review/report-file'
import { revisionTitleCells } from '@/app/(work)/_review/revision-title-cells'
import { Standing } from '@/app/(work)/_review/standing'
import { revisionDocument, revisionView } from '@/lib/server/revisions/queries'
import { DataTable } from '@/lib/ui/data-table'
import { Moment } from '@/lib/ui/moment'
import { Verdict } from '@/lib/ui/verdict'

export const metadata: Metadata = { title: 'Report' }

export default async function ReportPage({ params }: PageProps<'/reports/[reportId]'>) {
  const { reportId } = await params
  const revision = await ask(revisionView, { revisionId: reportId })
  const results = { document: await ask(revisionDocument, { revisionId: reportId }), summary: revision.summary }
  return (
    <WorkFrame
      path={[{ label: 'Projects', href: '/projects' }, { label: `${revision.title}, revision ${revision.number}` }]}
      cells={revisionTitleCells(revision)}
    >
      <div className="mx-auto flex max-w-4xl flex-col gap-5">
        <h1 className="m-0 text-title font-semibold">{revision.title}</h1>
        <Standing revision={revision} hrefOf={(id) => `/reports/${id}`} />
        <ReportFile revision={revision} href={`/reports/${reportId}/file`} />
        <section aria-labelledby="verdict" className="border-2 border-ink bg-sheet px-4 py-3">
          <h2 id="verdict" className="m-0 mb-1 text-title font-semibold">
            The design <Verdict word={revision.summary.overall.word} strong />
          </h2>
          <p className="m-0">{governingSentence(results) ?? 'No limit could be assessed.'}</p>
        </section>
        <section aria-labelledby="signers">
          <h2 id="signers" className="m-0 mb-1 text-title font-semibold">
            Signed by
          </h2>
          <DataTable
            caption="Signatures in the report"
            rows={revision.signoffs}
            rowId={({ role }) => role}
            columns={[
              { id: 'role', label: 'As', cell: ({ role }) => signOffWords[role] },
              { id: 'person', label: 'Person', cell: ({ person }) => person },
              { id: 'at', label: 'Signed', cell: ({ at }) => <Moment at={at} /> },
            ]}
          />
        </section>
        <Cautions document={results.document} />
      </div>
    </WorkFrame>
  )
}
