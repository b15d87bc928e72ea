import 'server-only'
import * as z from 'zod'
import { can } from '@/lib/policy/can'
import type { CommentsView } from '@/lib/study/review-view'
import { ownQuery, query } from '../read'
import { ofRevision } from '../revisions/schema'
import { loadRevision } from '../revisions/subject'
import { loadGround } from './ground'
import { holdUpsOf } from './hold-ups'
import { participantsOf } from './participants'
import { presentComment, withEntries } from './present'
import { commentsIn } from './visible'

const readable = {
  input: ofRevision,
  scope: ({ revisionId }: { revisionId: string }) => ({ kind: 'revision' as const, id: revisionId }),
  load: ({ tx }: { tx: Parameters<typeof loadRevision>[0] }, { revisionId }: { revisionId: string }) =>
    loadRevision(tx, revisionId),
  may: (actor: Parameters<typeof can>[0], { subject }: Awaited<ReturnType<typeof loadRevision>>) =>
    can(actor, 'read-comments', subject),
}

/** The comments that stand in a revision, each with what it is about as that reads here, and what holds up its closing. */
export const revisionComments = query({
  ...readable,
  run: async ({ tx, policy, at }, { revisionId }, { row, subject }): Promise<CommentsView> => {
    const rows = await tx.comment.findMany({
      where: await commentsIn(tx, revisionId),
      orderBy: { number: 'asc' },
      ...withEntries,
    })
    const ground = rows.length > 0 ? await loadGround(tx, revisionId) : null
    const { sequence } = await tx.project.findFirstOrThrow({
      where: { id: row.projectId },
      select: { sequence: true },
    })
    return {
      sequence,
      revisionId,
      comments: ground ? rows.map((one) => presentComment(one, revisionId, ground, policy)) : [],
      people: await participantsOf(tx, row.projectId, at),
      holdUps: await holdUpsOf(tx, revisionId),
      may: {
        comment: can(policy, 'comment', subject).allowed,
        respond: can(policy, 'respond-comment', subject).allowed,
        waive: can(policy, 'waive', subject).allowed,
      },
    }
  },
})

/** Inputs that the checker has held against their sources. */
export const inputTicks = query({
  ...readable,
  run: async ({ tx }, { revisionId }): Promise<{ anchor: string; value: string; person: string; at: string }[]> => {
    const rows = await tx.inputTick.findMany({ where: { revisionId }, orderBy: { anchor: 'asc' } })
    return rows.map(({ anchor, value, personName, at }) => ({
      anchor,
      value,
      person: personName,
      at: at.toISOString(),
    }))
  },
})

/** A notice in a person's inbox. */
export interface InboxLine {
  noticeId: string
  kind: string
  by: string
  excerpt: string
  at: string
  read: boolean
  comment: number
  commentId: string
  studyId: string
  revisionId: string
  title: string
}

/** What waits for the person, in every organisation, newest first. */
export const myInbox = ownQuery({
  input: z.object({}),
  own: async ({ tx, actor, each }): Promise<InboxLine[]> => {
    const lists = await each(() =>
      tx.notice.findMany({
        where: { userId: actor.userId },
        orderBy: { at: 'desc' },
        take: 200,
        include: { comment: { select: { number: true, studyId: true, study: { select: { title: true } } } } },
      }),
    )
    return lists
      .flat()
      .sort((a, b) => b.at.getTime() - a.at.getTime())
      .map((row) => ({
        noticeId: row.id,
        kind: row.kind,
        by: row.byName,
        excerpt: row.excerpt,
        at: row.at.toISOString(),
        read: row.readAt !== null,
        comment: row.comment.number,
        commentId: row.commentId,
        studyId: row.comment.studyId,
        revisionId: row.revisionId,
        title: row.comment.study.title,
      }))
  },
})

/** How many notices the person has not read. */
export const unreadNotices = ownQuery({
  input: z.object({}),
  own: async ({ tx, actor, each }): Promise<number> => {
    const counts = await each(() => tx.notice.count({ where: { userId: actor.userId, readAt: null } }))
    return counts.reduce((sum, count) => sum + count, 0)
  },
})
