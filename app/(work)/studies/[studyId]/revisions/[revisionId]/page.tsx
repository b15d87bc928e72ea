import type { Metadata } from 'next'
import { Suspense } from 'react'
import { ask, seek } from '@/app/_action/ask'
import { ownCertificate } from '@/app/_action/own-certificate'
import { signedIn } from '@/app/_action/signed-in'
import { GoToAnchor } from '@/app/(work)/_comments/go-to-anchor'
import { placeGroups } from '@/app/(work)/_comments/place-groups'
import { ReviewComments } from '@/app/(work)/_comments/review-comments'
import { RevisionInputs } from '@/app/(work)/_comments/revision-inputs'
import { PlaceList } from '@/app/(work)/_frame/place-list'
import { studyPlaces } from '@/app/(work)/_frame/places'
import { WorkFrame } from '@/app/(work)/_frame/work-frame'
import { caseResult } from '@/app/(work)/_results/results'
import { caseToOpen, ResultsView } from '@/app/(work)/_results/results-view'
import { DecisionLog } from '@/app/(work)/_review/decision-log'
import { Decisions } from '@/app/(work)/_review/decisions'
import { MovedSince } from '@/app/(work)/_review/moved-since'
import { PreIssueChecks } from '@/app/(work)/_review/pre-issue'
import { ReportFile } from '@/app/(work)/_review/report-file'
import { revisionTitleCells } from '@/app/(work)/_review/revision-title-cells'
import { SigningRound } from '@/app/(work)/_review/signing-round'
import { Standing } from '@/app/(work)/_review/standing'
import { can } from '@/lib/policy/can'
import { inputTicks, revisionComments } from '@/lib/server/reviews/queries'
import { keptChecks } from '@/lib/server/revisions/kept-checks'
import { revisionDocument, revisionSeries, revisionView } from '@/lib/server/revisions/queries'
import { purposes } from '@/lib/server/revisions/schema'
import { Moment } from '@/lib/ui/moment'

export const metadata: Metadata = { title: 'Revision' }

export default async function RevisionPage({
  params,
  searchParams,
}: PageProps<'/studies/[studyId]/revisions/[revisionId]'>) {
  const { studyId, revisionId } = await params
  const { userId } = await signedIn()
  const revision = await ask(revisionView, { revisionId })
  const results = { document: await ask(revisionDocument, { revisionId }), summary: revision.summary }
  const caseId = caseToOpen(results, (await searchParams).case)
  const series = caseResult(results, caseId) ? await seek(revisionSeries, { revisionId, caseId }) : null
  const comments = await seek(revisionComments, { revisionId })
  const ticks = comments ? await ask(inputTicks, { revisionId }) : []
  const checks = keptChecks(revision.preIssueChecks)
  const team = can({ userId, roles: revision.roles }, 'read-study').allowed
  const base = `/studies/${studyId}/revisions`
  return (
    <WorkFrame
      path={[
        { label: 'Projects', href: '/projects' },
        team ? { label: revision.title, href: `/studies/${studyId}/review` } : { label: revision.title },
        { label: `Revision ${revision.number}` },
      ]}
      places={
        team ? <PlaceList label="Places of the study" places={studyPlaces(revision.projectId, studyId)} /> : undefined
      }
      cells={revisionTitleCells(revision)}
      live={{ projectId: revision.projectId, after: revision.sequence, where: `revision/${revisionId}` }}
    >
      <div className="flex flex-col gap-5">
        <div className="flex flex-col gap-2">
          <h1 className="m-0 text-title font-semibold">
            Revision {revision.number}
            {revision.attempt > 1 ? `, attempt ${revision.attempt}` : ''}
          </h1>
          <p className="m-0 text-soft">
            Frozen by {revision.preparedBy}, <Moment at={revision.frozenAt} />
            {revision.note ? `: ${revision.note}` : ''}
          </p>
          <Standing revision={revision} hrefOf={(id) => `${base}/${id}`} />
          <Decisions revisionId={revisionId} allowed={revision.allowed} purposes={purposes} />
        </div>
        <div className="grid grid-cols-1 items-start gap-5 xl:grid-cols-2">
          <SigningRound revision={revision} certificate={await ownCertificate(revision.organisationId)} />
          <ReportFile revision={revision} href={`${base}/${revisionId}/report`} />
        </div>
        <PreIssueChecks checks={checks} />
        {comments ? (
          <Suspense>
            <ReviewComments
              given={comments}
              href={`${base}/${revisionId}/comments`}
              page={`${base}/${revisionId}`}
              groups={placeGroups(results.document, checks)}
            />
            <GoToAnchor />
          </Suspense>
        ) : null}
        <DecisionLog decisions={revision.decisions} />
        <MovedSince moved={revision.movedSince} />
        {comments ? (
          <RevisionInputs
            revisionId={revisionId}
            document={results.document}
            ticks={ticks}
            mayTick={revision.allowed.includes('tick-input')}
          />
        ) : null}
        <ResultsView results={results} caseId={caseId} series={series} />
        <p className="m-0 text-label break-all text-soft">
          Hash of the frozen document: {revision.documentHash}. Hash of what was computed: {revision.inputHash}. Engine{' '}
          {revision.engineVersion}.
        </p>
      </div>
    </WorkFrame>
  )
}
