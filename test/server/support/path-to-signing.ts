import { perform } from '@/lib/server/perform'
import { read } from '@/lib/server/read'
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
  await perform(closeReview, actorAs('approver'), { revisionId, purpose: 'For approval by the utility' })
  await signingBegun(revisionId)
  return revisionId
}
