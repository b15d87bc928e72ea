import 'server-only'
import { mayClose, mayReopen } from '@/lib/policy/comment-rules'
import type { PolicyActor } from '@/lib/policy/role'
import { parseAnchor } from '@/lib/study/anchors/anchor'
import { type AnchorGround, findAnchor } from '@/lib/study/anchors/find-anchor'
import type { CommentLine, EntryLine } from '@/lib/study/review-view'
import type { CommentClass, CommentState, Response } from '@/lib/study/review-words'
import type { Prisma } from '@/prisma/generated/client'

export const withEntries = {
  include: { entries: { orderBy: { position: 'asc' } }, revision: { select: { number: true } } },
} as const satisfies Prisma.CommentDefaultArgs

type Row = Prisma.CommentGetPayload<typeof withEntries>

/** A comment as the revision with this ground shows it; the words of the columns are held by the database. */
export function presentComment(row: Row, revisionId: string, ground: AnchorGround, policy: PolicyActor): CommentLine {
  const anchor = parseAnchor(row.anchor)
  const found = anchor ? findAnchor(anchor, ground) : null
  return {
    commentId: row.id,
    number: row.number,
    anchor: row.anchor,
    about: found?.label ?? row.anchorLabel,
    valueThen: row.anchorValue,
    valueNow: found?.value ?? null,
    orphaned: found === null,
    carriedFrom: row.revisionId === revisionId ? null : row.revision.number,
    kind: row.kind as CommentClass,
    text: row.text,
    author: row.authorName,
    authorId: row.authorId,
    at: row.at.toISOString(),
    assignee: row.assigneeName,
    dueOn: row.dueOn,
    state: row.state as CommentState,
    response: row.response as Response | null,
    closedAt: row.closedAt?.toISOString() ?? null,
    entries: row.entries.map(({ id, kind, text, authorName, at }) => ({
      id,
      kind: kind as EntryLine['kind'],
      text,
      author: authorName,
      at: at.toISOString(),
    })),
    mayClose: row.state !== 'closed' && mayClose(policy, row.authorId, 'asked for').allowed,
    mayReopen: row.state === 'closed' && mayReopen(policy, row.authorId).allowed,
  }
}
