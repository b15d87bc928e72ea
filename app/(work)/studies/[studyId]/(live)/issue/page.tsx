import type { Metadata } from 'next'
import Link from 'next/link'
import { ask } from '@/app/_action/ask'
import { ownCertificate } from '@/app/_action/own-certificate'
import { Decisions } from '@/app/(work)/_review/decisions'
import { ReportFile } from '@/app/(work)/_review/report-file'
import { SigningRound } from '@/app/(work)/_review/signing-round'
import { Standing } from '@/app/(work)/_review/standing'
import { ShareSection } from '@/app/(work)/_share/share-section'
import type { RevisionAction } from '@/lib/policy/action'
import { revisionView } from '@/lib/server/revisions/queries'
import { purposes } from '@/lib/server/revisions/schema'
import type { RevisionState } from '@/lib/study/states'
import { EmptyState } from '@/lib/ui/empty-state'
import { studyOf } from '../study'

export const metadata: Metadata = { title: 'Issue' }

const here: readonly RevisionState[] = ['review-closed', 'issued', 'superseded', 'withdrawn']
const issuing: readonly RevisionAction[] = ['issue', 'withdraw']

export default async function IssuePage({ params }: PageProps<'/studies/[studyId]/issue'>) {
  const { studyId } = await params
  const { revisions, organisationId } = await studyOf(studyId)
  const lines = revisions.filter(({ state }) => here.includes(state))
  const shown = lines.find(({ state }) => state === 'review-closed') ?? lines[0]
  const base = `/studies/${studyId}/revisions`
  if (!shown)
    return (
      <>
        <h1 className="m-0 mb-4 text-title font-semibold">Issue</h1>
        <EmptyState title="Nothing is ready to be issued.">
          Close the review of a revision on the{' '}
          <Link prefetch={false} href={`/studies/${studyId}/review`} className="link">
            Review page
          </Link>{' '}
          first; the final report is then rendered and signed here.
        </EmptyState>
      </>
    )
  const revision = await ask(revisionView, { revisionId: shown.revisionId })
  return (
    <div className="flex max-w-4xl flex-col gap-5">
      <div className="flex flex-col gap-2">
        <h1 className="m-0 text-title font-semibold">Issue of revision {revision.number}</h1>
        <Standing revision={revision} hrefOf={(id) => `${base}/${id}`} />
        <p className="m-0">
          <Link prefetch={false} href={`${base}/${revision.revisionId}`} className="link">
            Open revision {revision.number}
          </Link>
        </p>
        <Decisions
          revisionId={revision.revisionId}
          allowed={revision.allowed.filter((action) => issuing.includes(action))}
          purposes={purposes}
        />
      </div>
      <SigningRound revision={revision} certificate={await ownCertificate(organisationId)} />
      <ReportFile revision={revision} href={`${base}/${revision.revisionId}/report`} />
      {revision.allowed.includes('end-share') ? (
        <ShareSection revisionId={revision.revisionId} mayShare={revision.allowed.includes('share-report')} />
      ) : null}
      <p className="m-0 text-dense">
        <a className="link" href={`/authority/${organisationId}`} download>
          Download the organisation’s root certificate
        </a>{' '}
        to trust its signatures in another viewer.
      </p>
    </div>
  )
}
