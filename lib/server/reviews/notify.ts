import 'server-only'
import type { Participant } from '@/lib/study/review-view'
import type { WriteContext } from '../context'
import { newId } from '../identity'
import { mentionedIn } from './participants'

export type NoticeKind = 'mention' | 'assigned' | 'reply' | 'answer'

interface About {
  commentId: string
  revisionId: string
  text: string
  people: readonly Participant[]
  /** Who is told and why, the most pressing first; nobody is told twice. */
  to: readonly { userId: string | null; kind: NoticeKind }[]
}

const excerptLength = 160

/** Puts what was written into the inboxes of those whom it concerns; never into the writer's own. */
export async function notify(
  { tx, actor, place: { organisationId }, at }: WriteContext,
  { commentId, revisionId, text, people, to }: About,
): Promise<void> {
  const wanted = [...mentionedIn(text, people).map(({ userId }) => ({ userId, kind: 'mention' as const })), ...to]
  const told = new Map<string, NoticeKind>()
  for (const { userId, kind } of wanted)
    if (userId !== null && userId !== actor.userId && people.some((one) => one.userId === userId) && !told.has(userId))
      told.set(userId, kind)
  const excerpt = text.length > excerptLength ? `${text.slice(0, excerptLength - 1)}…` : text
  await tx.notice.createMany({
    data: [...told].map(([userId, kind]) => ({
      organisationId,
      id: newId(),
      userId,
      commentId,
      revisionId,
      kind,
      byName: actor.name,
      excerpt,
      at,
    })),
  })
}
