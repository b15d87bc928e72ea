import 'server-only'
import * as z from 'zod'
import { can } from '@/lib/policy/can'
import { idInput } from '../identity'
import { command } from '../perform'
import { requestReportAgain } from '../reports/request-report'
import { loadStudy } from '../studies/study-of'
import { closeReviewOf } from './close-review'
import { freeze } from './freeze'
import { issue, withdraw } from './issue'
import { moveRevision } from './move'
import { note, ofRevision, purpose, reason } from './schema'
import { loadRevision } from './subject'
import { takeBack } from './take-back'

const revisionScope = ({ revisionId }: { revisionId: string }) => ({ kind: 'revision' as const, id: revisionId })
const load = async ({ tx }: { tx: Parameters<typeof loadRevision>[0] }, { revisionId }: { revisionId: string }) =>
  loadRevision(tx, revisionId)

/** Freezes plant, study and the results that belong to them as the next revision, or as a further attempt at it. */
export const freezeRevision = command({
  input: z.object({ studyId: idInput, note }),
  scope: ({ studyId }) => ({ kind: 'study' as const, id: studyId }),
  load: async ({ tx }, { studyId }) => loadStudy(tx, studyId),
  may: (actor) => can(actor, 'freeze'),
  run: (context, input, study) => freeze(context, study, input.note),
})

/** Hands a frozen revision over to the checker. */
export const sendForCheck = command({
  input: ofRevision.extend({ note }),
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'send-for-check', subject),
  run: (context, input, { row }) => moveRevision(context, row, 'send-for-check', input.note),
})

/** The checker's decision: on to the review, or back to the preparer with a reason. */
export const decideCheck = command({
  input: z.discriminatedUnion('accepted', [
    ofRevision.extend({ accepted: z.literal(true), note }),
    ofRevision.extend({ accepted: z.literal(false), note: reason }),
  ]),
  scope: revisionScope,
  load,
  may: (actor, { subject }, { accepted }) => can(actor, accepted ? 'accept-check' : 'reject-check', subject),
  run: (context, input, { row }) =>
    moveRevision(context, row, input.accepted ? 'accept-check' : 'reject-check', input.note),
})

/** The approver's decision on the review; accepting leaves it open until it is closed. */
export const decideReview = command({
  input: z.discriminatedUnion('accepted', [
    ofRevision.extend({ accepted: z.literal(true), note }),
    ofRevision.extend({ accepted: z.literal(false), note: reason }),
  ]),
  scope: revisionScope,
  load,
  may: (actor, { subject }, { accepted }) => can(actor, accepted ? 'accept-review' : 'reject-review', subject),
  run: (context, input, { row }) =>
    moveRevision(context, row, input.accepted ? 'accept-review' : 'reject-review', input.note),
})

/** Closes the review with the purpose of issue; a worker renders the final report, and then the signing begins. */
export const closeReview = command({
  input: ofRevision.extend({ purpose, note }),
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'close-review', subject),
  run: (context, input, { row }) => closeReviewOf(context, row, input.purpose, input.note),
})

/**
 * Asks for the report once more after its rendering failed.
 * @public
 */
export const renderAgain = command({
  input: ofRevision,
  scope: revisionScope,
  load,
  may: (actor) => can(actor, 'read-study'),
  run: (context, _input, { row }) => requestReportAgain(context, row),
})

/** Takes a revision back, with a reason; a signing round that has begun is over with it. */
export const backToDraft = command({
  input: ofRevision.extend({ reason }),
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'back-to-draft', subject),
  run: (context, input, { row }) => takeBack(context, row, input.reason),
})

/** Releases the file that all three have signed; the revision issued before is superseded. */
export const issueRevision = command({
  input: ofRevision.extend({ note }),
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'issue', subject),
  run: (context, input, { row }) => issue(context, row, input.note),
})

/** Withdraws a revision that must no longer be relied on; its signed file stays as it is. */
export const withdrawRevision = command({
  input: ofRevision.extend({ reason }),
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'withdraw', subject),
  run: (context, input, { row }) => withdraw(context, row, input.reason),
})
