import { perform } from '@/lib/server/perform'
import { read } from '@/lib/server/read'
import { waive } from '@/lib/server/reviews/commands'
import { revisionComments } from '@/lib/server/reviews/queries'
import { closeReview, decideCheck, decideReview, freezeRevision, sendForCheck } from '@/lib/server/revisions/commands'
import { revisionView } from '@/lib/server/revisions/queries'
import { studyView } from '@/lib/server/studies/queries'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from './cast-actor'
import { until } from './worker'

/** Waits until a worker has computed all cases of the demo's study. */
export const computed = () =>
  until(
    () => read(studyView, actorAs('engineer'), { studyId: demo.studyId }),
    ({ run }) => run.state === 'done' || run.state === 'failed',
  )

/** The approver waives whatever holds up the closing of a review. */
export async function waiveAll(revisionId: string): Promise<void> {
  const { holdUps } = await read(revisionComments, actorAs('approver'), { revisionId })
  for (const { kind, subjectId } of holdUps) {
    await perform(waive, actorAs('approver'), { revisionId, kind, subjectId, reason: 'Known, and agreed.' })
  }
}

/** Waits until a worker has rendered the final report, with which the signing begins. */
export const signingBegun = (revisionId: string) =>
  until(
    () => read(revisionView, actorAs('engineer'), { revisionId }),
    ({ roundStartedAt, renderState }) => roundStartedAt !== null || renderState === 'failed',
  )

/** Takes the computed study to the point where its report waits for the first signature. */
export async function bringToSigning(): Promise<string> {
  const { revisionId } = await perform(freezeRevision, actorAs('engineer'), { studyId: demo.studyId })
  await perform(sendForCheck, actorAs('engineer'), { revisionId })
  await perform(decideCheck, actorAs('checker'), { revisionId, accepted: true })
  await perform(decideReview, actorAs('approver'), { revisionId, accepted: true })
  await waiveAll(revisionId)
  await perform(closeReview, actorAs('approver'), { revisionId, purpose: 'For approval by the utility' })
  await signingBegun(revisionId)
  return revisionId
}
