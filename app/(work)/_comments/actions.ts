'use server'

import type * as z from 'zod'
import { attempt } from '@/app/_action/attempt'
import { perform } from '@/lib/server/perform'
import {
  addComment,
  closeComment,
  readNotices,
  reopenComment,
  replyToComment,
  respondToComment,
  tickInput,
  waive as waiveHoldUp,
} from '@/lib/server/reviews/commands'

export async function comment(input: z.input<typeof addComment.input>) {
  return attempt((actor) => perform(addComment, actor, input))
}

export async function reply(revisionId: string, commentId: string, text: string) {
  return attempt((actor) => perform(replyToComment, actor, { revisionId, commentId, text }))
}

export async function respond(revisionId: string, commentId: string, response: 'accepted' | 'refused', text: string) {
  return attempt((actor) => perform(respondToComment, actor, { revisionId, commentId, response, text }))
}

export async function close(revisionId: string, commentId: string, reason: string) {
  return attempt((actor) => perform(closeComment, actor, { revisionId, commentId, reason }))
}

export async function reopen(revisionId: string, commentId: string) {
  return attempt((actor) => perform(reopenComment, actor, { revisionId, commentId }))
}

export async function waive(revisionId: string, kind: 'check' | 'comment', subjectId: string, reason: string) {
  return attempt((actor) => perform(waiveHoldUp, actor, { revisionId, kind, subjectId, reason }))
}

export async function tick(revisionId: string, anchor: string, ticked: boolean) {
  return attempt((actor) => perform(tickInput, actor, { revisionId, anchor, ticked }))
}

export async function markRead(revisionId: string) {
  return attempt((actor) => perform(readNotices, actor, { revisionId }))
}
