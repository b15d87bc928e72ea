import 'server-only'
import { DomainError } from '@/lib/errors'
import type { EntryLine, Participant } from '@/lib/study/review-view'
import type { WriteContext } from '../context'
import type { Tx } from '../db'
import { newId } from '../identity'
import { type NoticeKind, notify } from './notify'
import { commentsIn } from './visible'

/** A comment that stands in the revision from which it is spoken of; null where there is none. */
export async function loadComment(tx: Tx, { revisionId, commentId }: { revisionId: string; commentId: string }) {
  return tx.comment.findFirst({
    where: { AND: [{ id: commentId }, await commentsIn(tx, revisionId)] },
    select: {
      id: true,
      number: true,
      state: true,
      authorId: true,
      assigneeId: true,
      _count: { select: { entries: true } },
    },
  })
}

type SpokenOf = NonNullable<Awaited<ReturnType<typeof loadComment>>>

/** The comment; asked for after permission, so that its absence is told to those only who may know. */
export function required(comment: SpokenOf | null): SpokenOf {
  if (!comment) throw new DomainError('not-found', 'There is no such comment in this revision.')
  return comment
}

interface NewEntry {
  kind: EntryLine['kind']
  text: string
  revisionId: string
  people: readonly Participant[]
  /** As what author and assignee are told; null for nobody. */
  told: NoticeKind | null
}

/** Adds to what is written below a comment, and tells those whom it concerns. */
export async function addEntry(
  context: WriteContext,
  comment: SpokenOf,
  { kind, text, revisionId, people, told }: NewEntry,
): Promise<void> {
  const { tx, actor, place, at } = context
  const { id: commentId } = comment
  const author = { authorId: actor.userId, authorName: actor.name }
  await tx.commentEntry.create({
    data: {
      organisationId: place.organisationId,
      id: newId(),
      commentId,
      position: comment._count.entries + 1,
      kind,
      text,
      ...author,
      at,
    },
  })
  const to = told === null ? [] : [comment.authorId, comment.assigneeId].map((userId) => ({ userId, kind: told }))
  await notify(context, { commentId, revisionId, text, people, to })
}
