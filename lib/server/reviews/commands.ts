import 'server-only'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { mayClose, mayReopen } from '@/lib/policy/comment-rules'
import { all, allowed } from '@/lib/policy/permission'
import { command } from '../perform'
import { ofRevision } from '../revisions/schema'
import { loadRevision } from '../revisions/subject'
import { addCommentTo } from './add-comment'
import { addEntry, loadComment, required } from './entries'
import { participantsOf } from './participants'
import { newClosing, newComment, newReply, newResponse, newTick, newWaiver, ofComment } from './schema'
import { tick } from './tick'
import { waiveHoldUp } from './waive'

const revisionScope = ({ revisionId }: { revisionId: string }) => ({ kind: 'revision' as const, id: revisionId })

type Loads = { tx: Parameters<typeof loadRevision>[0] }

const load = async ({ tx }: Loads, { revisionId }: { revisionId: string }) => loadRevision(tx, revisionId)

const loadWithComment = async ({ tx }: Loads, input: { revisionId: string; commentId: string }) => ({
  ...(await loadRevision(tx, input.revisionId)),
  comment: await loadComment(tx, input),
})

const event = (action: string, id: string, payload: Record<string, unknown>) => ({
  action,
  subject: { kind: 'comment', id },
  payload,
})

/** Makes a comment on something in a revision. */
export const addComment = command({
  input: newComment,
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'comment', subject),
  run: (context, input, { row }) => addCommentTo(context, row, input),
})

/** Adds to the thread below a comment. */
export const replyToComment = command({
  input: newReply,
  scope: revisionScope,
  load: loadWithComment,
  may: (actor, { subject }) => can(actor, 'comment', subject),
  run: async (context, { revisionId, commentId, text }, { row, comment: found }) => {
    const comment = required(found)
    const people = await participantsOf(context.tx, row.projectId, context.at)
    await addEntry(context, comment, { kind: 'reply', text, revisionId, people, told: 'reply' })
    return {
      answer: { commentId },
      events: [event('comment-replied', commentId, { revisionId, number: comment.number, text })],
    }
  },
})

/** Answers a comment in writing: what it asks for is accepted, or refused with the reason. */
export const respondToComment = command({
  input: newResponse,
  scope: revisionScope,
  load: loadWithComment,
  may: (actor, { subject }) => can(actor, 'respond-comment', subject),
  run: async (context, { revisionId, commentId, response, text }, { row, comment: found }) => {
    const comment = required(found)
    if (comment.state === 'closed')
      throw new DomainError('wrong-state', `Comment ${comment.number} is closed: its author can take it up again.`)
    const { tx, place } = context
    const people = await participantsOf(tx, row.projectId, context.at)
    await tx.comment.update({
      where: { organisationId_id: { organisationId: place.organisationId, id: commentId } },
      data: { state: 'answered', response },
    })
    await addEntry(context, comment, { kind: response, text, revisionId, people, told: 'answer' })
    return {
      answer: { commentId },
      events: [event('comment-answered', commentId, { revisionId, number: comment.number, response, text })],
    }
  },
})

/** Closes a comment: its author is content, or an administrator says why it is closed for them. */
export const closeComment = command({
  input: newClosing,
  scope: revisionScope,
  load: loadWithComment,
  may: (actor, { subject, comment }, { reason }) =>
    all(can(actor, 'close-comment', subject), comment ? mayClose(actor, comment.authorId, reason) : allowed),
  run: async (context, { revisionId, commentId, reason }, { row, comment: found }) => {
    const comment = required(found)
    if (comment.state === 'closed') throw new DomainError('wrong-state', `Comment ${comment.number} is closed already.`)
    const { tx, place, at } = context
    const people = await participantsOf(tx, row.projectId, at)
    await tx.comment.update({
      where: { organisationId_id: { organisationId: place.organisationId, id: commentId } },
      data: { state: 'closed', closedAt: at },
    })
    await addEntry(context, comment, { kind: 'closed', text: reason, revisionId, people, told: null })
    return {
      answer: { commentId },
      events: [event('comment-closed', commentId, { revisionId, number: comment.number, reason })],
    }
  },
})

/** Takes a closed comment up again. */
export const reopenComment = command({
  input: ofComment,
  scope: revisionScope,
  load: loadWithComment,
  may: (actor, { subject, comment }) =>
    all(can(actor, 'close-comment', subject), comment ? mayReopen(actor, comment.authorId) : allowed),
  run: async (context, { revisionId, commentId }, { row, comment: found }) => {
    const comment = required(found)
    if (comment.state !== 'closed') throw new DomainError('wrong-state', `Comment ${comment.number} is not closed.`)
    const { tx, place, at } = context
    const people = await participantsOf(tx, row.projectId, at)
    await tx.comment.update({
      where: { organisationId_id: { organisationId: place.organisationId, id: commentId } },
      data: { state: 'open', response: null, closedAt: null },
    })
    await addEntry(context, comment, { kind: 'reopened', text: '', revisionId, people, told: null })
    return {
      answer: { commentId },
      events: [event('comment-reopened', commentId, { revisionId, number: comment.number })],
    }
  },
})

/** Lets the review be closed in spite of one thing that holds it up, for a reason that the report prints. */
export const waive = command({
  input: newWaiver,
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'waive', subject),
  run: (context, input) => waiveHoldUp(context, input),
})

/** The checker has held an input against its source, or takes that back. */
export const tickInput = command({
  input: newTick,
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'tick-input', subject),
  run: (context, input) => tick(context, input),
})

/** Marks what waits in the person's inbox for a revision as read. */
export const readNotices = command({
  input: ofRevision,
  scope: revisionScope,
  load,
  may: (actor, { subject }) => can(actor, 'read-comments', subject),
  run: async ({ tx, actor, at }, { revisionId }) => {
    const where = { revisionId, userId: actor.userId, readAt: null }
    const { count } = await tx.notice.updateMany({ where, data: { readAt: at } })
    return { answer: { count }, events: [] }
  },
})
