import type * as z from 'zod'
import { DomainError } from '@/lib/errors'
import type { Actor } from '@/lib/server/actor'
import { compareRevisions } from '@/lib/server/compare/queries'
import { type Database, database } from '@/lib/server/db'
import { livePlace } from '@/lib/server/live/queries'
import { createProject } from '@/lib/server/people/commands'
import { inviteMember, withdrawInvitation } from '@/lib/server/people/invite'
import { changeMember } from '@/lib/server/people/member-commands'
import { projectMembers } from '@/lib/server/people/member-queries'
import { type Command, perform } from '@/lib/server/perform'
import { addRecord, changeRecord, removeRecord } from '@/lib/server/plants/commands'
import { plantRecords } from '@/lib/server/plants/queries'
import { type Query, read } from '@/lib/server/read'
import * as reviews from '@/lib/server/reviews/commands'
import * as reviewQueries from '@/lib/server/reviews/queries'
import * as revisions from '@/lib/server/revisions/commands'
import * as revisionQueries from '@/lib/server/revisions/queries'
import { endShare, shareReport } from '@/lib/server/share/commands'
import { shareLinks } from '@/lib/server/share/queries'
import { completeSignature, prepareSignature } from '@/lib/server/signoff/commands'
import * as studies from '@/lib/server/studies/commands'
import * as studyQueries from '@/lib/server/studies/queries'
import { projectTimeline } from '@/lib/server/timeline/queries'

/** What the actions are tried on. */
export interface Place {
  organisationId: string
  projectId: string
  studyId: string
  revisionId: string
}

/** One thing that somebody may ask of the server; tried, it leaves nothing behind. */
export interface Attempt {
  name: string
  try(actor: Actor, place: Place): Promise<'let in' | string>
}

class Undo extends Error {}

/** The same database, but every transaction is undone at its end: what would have happened is known, and has not. */
const undone = () => {
  const db = database()
  const transaction = async (work: Parameters<Database['$transaction']>[0], options: object) => {
    await db.$transaction(async (tx) => {
      await (work as unknown as (tx: unknown) => Promise<unknown>)(tx)
      throw new Undo()
    }, options)
  }
  return { $transaction: transaction } as unknown as Database
}

/**
 * Whether somebody was let in, or the code of the refusal. What policy has allowed may still be refused for another reason (nothing
 * to stop, an incomplete record), which is not what is asked here.
 */
async function outcome(ask: () => Promise<unknown>): Promise<'let in' | string> {
  try {
    await ask()
    return 'let in'
  } catch (error) {
    if (error instanceof Undo) return 'let in'
    if (!(error instanceof DomainError)) throw error
    if (error.code === 'forbidden') return 'forbidden'
    return /nothing here that you can open/.test(error.message) ? 'unreachable' : 'let in'
  }
}

/** The input, once the shape has taken it: a refusal must never be about the input. */
const fitting = <Shape extends z.ZodType>(shape: Shape, given: unknown): z.input<Shape> => {
  shape.parse(given)
  return given as z.input<Shape>
}

const does = <Shape extends z.ZodType, Subject, Answer>(
  name: string,
  command: Command<Shape, Subject, Answer>,
  input: (place: Place) => unknown,
): Attempt => ({
  name,
  try: async (actor, place) => {
    const given = fitting(command.input, input(place))
    return outcome(() => perform(command, actor, given, undone()))
  },
})

const asks = <Shape extends z.ZodType, Subject, Answer>(
  name: string,
  query: Query<Shape, Subject, Answer>,
  input: (place: Place) => unknown,
): Attempt => ({
  name,
  try: async (actor, place) => {
    const given = fitting(query.input, input(place))
    return outcome(() => read(query, actor, given))
  },
})

const bus = { kind: 'bus' as const, id: 'pcc', version: 1 }
const schedule = { kind: 'schedule' as const, id: 'none', version: 1 }
const value = Buffer.alloc(64).toString('base64')
const ofProject = ({ projectId }: Place) => ({ projectId })
const ofStudy = ({ studyId }: Place) => ({ studyId })
const ofRevision = ({ revisionId }: Place) => ({ revisionId })
const reason = 'Tried by a test.'
/** A comment that is not there: its absence is told after policy has been asked. */
const ofNothing =
  (more: object) =>
  ({ revisionId }: Place) => ({ revisionId, commentId: 'none', ...more })

/** What concerns the live records and the people of a project, whatever state a revision is in. */
export const liveAttempts: readonly Attempt[] = [
  does('createProject', createProject, ({ organisationId }) => ({ organisationId, name: 'Another' })),
  does('inviteMember', inviteMember, ({ projectId }) => {
    const person = { name: 'N. Newcomer', email: 'n@newcomers.example', guest: false }
    return { projectId, ...person, roles: ['engineer'] }
  }),
  does('withdrawInvitation', withdrawInvitation, ({ projectId }) => ({ projectId, invitationId: 'none' })),
  does('changeMember', changeMember, ({ projectId }) => ({ projectId, userId: 'demo-obede', roles: ['engineer'] })),
  asks('projectMembers', projectMembers, ofProject),
  asks('livePlace', livePlace, ofProject),
  asks('projectTimeline', projectTimeline, ofProject),
  asks('plantRecords', plantRecords, ofProject),
  does('addRecord', addRecord, ({ projectId }) => ({ projectId, kind: 'bus', values: {} })),
  does('changeRecord', changeRecord, ({ projectId }) => ({ projectId, ...bus, values: {} })),
  does('removeRecord', removeRecord, ({ projectId }) => ({ projectId, ...bus })),
  does('createStudy', studies.createStudy, ({ projectId }) => {
    return { projectId, title: 'Another', documentNumber: 'X-1', utility: '', frequency: '50 Hz' }
  }),
  asks('studyView', studyQueries.studyView, ofStudy),
  asks('runProgress', studyQueries.runProgress, ofStudy),
  asks('studyResults', studyQueries.studyResults, ofStudy),
  asks('caseSeries', studyQueries.caseSeries, ({ studyId }) => ({ studyId, caseId: 'none' })),
  does('changeStudy', studies.changeStudy, ({ studyId }) => ({ studyId, version: 1, numberStyle: 'point' })),
  does('addStudyRecord', studies.addStudyRecord, ({ studyId }) => ({ studyId, kind: 'schedule', values: {} })),
  does('changeStudyRecord', studies.changeStudyRecord, ({ studyId }) => ({ studyId, ...schedule, values: {} })),
  does('removeStudyRecord', studies.removeStudyRecord, ({ studyId }) => ({ studyId, ...schedule })),
  does('computeStudy', studies.computeStudy, ofStudy),
  does('stopComputing', studies.stopComputing, ofStudy),
  does('freezeRevision', revisions.freezeRevision, ofStudy),
]

/** What concerns one revision. */
export const revisionAttempts: readonly Attempt[] = [
  asks('revisionView', revisionQueries.revisionView, ofRevision),
  asks('revisionDocument', revisionQueries.revisionDocument, ofRevision),
  asks('revisionSeries', revisionQueries.revisionSeries, ({ revisionId }) => ({ revisionId, caseId: 'none' })),
  asks('revisionComments', reviewQueries.revisionComments, ofRevision),
  asks('compareRevisions', compareRevisions, ({ revisionId }) => ({ from: revisionId, to: revisionId })),
  asks('inputTicks', reviewQueries.inputTicks, ofRevision),
  does('addComment', reviews.addComment, ({ revisionId }) => {
    return { revisionId, anchor: 'revision', kind: 'question', text: 'Is this so?' }
  }),
  does('respondToComment', reviews.respondToComment, ofNothing({ response: 'accepted', text: 'Done.' })),
  does('replyToComment', reviews.replyToComment, ofNothing({ text: 'And this?' })),
  does('closeComment', reviews.closeComment, ofNothing({})),
  does('reopenComment', reviews.reopenComment, ofNothing({})),
  does('waive', reviews.waive, ({ revisionId }) => ({ revisionId, kind: 'check', subjectId: 'none', reason })),
  does('tickInput', reviews.tickInput, ({ revisionId }) => ({ revisionId, anchor: 'revision', ticked: false })),
  does('readNotices', reviews.readNotices, ofRevision),
  does('sendForCheck', revisions.sendForCheck, ofRevision),
  does('decideCheck yes', revisions.decideCheck, ({ revisionId }) => ({ revisionId, accepted: true })),
  does('decideCheck no', revisions.decideCheck, ({ revisionId }) => ({ revisionId, accepted: false, note: reason })),
  does('decideReview yes', revisions.decideReview, ({ revisionId }) => ({ revisionId, accepted: true })),
  does('decideReview no', revisions.decideReview, ({ revisionId }) => ({ revisionId, accepted: false, note: reason })),
  does('closeReview', revisions.closeReview, ({ revisionId }) => ({ revisionId, purpose: 'For review' })),
  does('renderAgain', revisions.renderAgain, ofRevision),
  does('backToDraft', revisions.backToDraft, ({ revisionId }) => ({ revisionId, reason })),
  does('sign prepared', prepareSignature, ({ revisionId }) => ({ revisionId, role: 'prepared' })),
  does('sign checked', prepareSignature, ({ revisionId }) => ({ revisionId, role: 'checked' })),
  does('sign approved', prepareSignature, ({ revisionId }) => ({ revisionId, role: 'approved' })),
  does('issueRevision', revisions.issueRevision, ofRevision),
  does('withdrawRevision', revisions.withdrawRevision, ({ revisionId }) => ({ revisionId, reason })),
  does('shareReport', shareReport, ({ revisionId }) => {
    return { revisionId, recipient: 'Nobody', days: 1, mostDownloads: 1 }
  }),
  does('endShare', endShare, ({ revisionId }) => ({ revisionId, shareId: 'none' })),
  asks('shareLinks', shareLinks, ofRevision),
]

/** Let in by its own scope without a role (each revision of the answer is asked about), or refused before policy by its token. */
export const furtherAttempts: readonly Attempt[] = [
  asks('revisionsOf', revisionQueries.revisionsOf, ofStudy),
  does('completeSignature', completeSignature, ({ revisionId }) => ({ revisionId, token: 'forged', value })),
]
