import 'server-only'
import type * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { parseAnchor } from '@/lib/study/anchors/anchor'
import { findAnchor } from '@/lib/study/anchors/find-anchor'
import type { WriteContext } from '../context'
import { newId } from '../identity'
import type { Done } from '../perform'
import type { RevisionWithSubject } from '../revisions/subject'
import { loadGround } from './ground'
import { notify } from './notify'
import { participant, participantsOf } from './participants'
import type { newComment } from './schema'

/** Makes the next comment of the study, with words and value of what it is about as they stand in the revision. */
export async function addCommentTo(
  context: WriteContext,
  row: RevisionWithSubject,
  { revisionId, anchor, kind, text, assigneeId, dueOn }: z.output<typeof newComment>,
): Promise<Done<{ commentId: string; number: number }>> {
  const { tx, actor, place, at } = context
  const parsed = parseAnchor(anchor)
  const found = parsed ? findAnchor(parsed, await loadGround(tx, revisionId)) : null
  if (!found) throw new DomainError('invalid', 'This revision has no such place: choose what the comment is about.')
  const people = await participantsOf(tx, row.projectId, at)
  const assignee = assigneeId === null ? null : participant(people, assigneeId)
  const last = await tx.comment.findFirst({
    where: { studyId: row.studyId },
    orderBy: { number: 'desc' },
    select: { number: true },
  })
  const number = (last?.number ?? 0) + 1
  const id = newId()
  await tx.comment.create({
    data: {
      organisationId: place.organisationId,
      id,
      projectId: row.projectId,
      studyId: row.studyId,
      revisionId,
      number,
      anchor,
      anchorLabel: found.label,
      anchorValue: found.value,
      kind,
      text,
      authorId: actor.userId,
      authorName: actor.name,
      at,
      assigneeId: assignee?.userId ?? null,
      assigneeName: assignee?.name ?? null,
      dueOn,
      state: 'open',
    },
  })
  await notify(context, {
    commentId: id,
    revisionId,
    text,
    people,
    to: [{ userId: assignee?.userId ?? null, kind: 'assigned' }],
  })
  const payload = { revisionId, number, anchor, about: found.label, value: found.value, kind, text, assigneeId, dueOn }
  return {
    answer: { commentId: id, number },
    events: [{ action: 'comment-made', subject: { kind: 'comment', id }, payload }],
  }
}
