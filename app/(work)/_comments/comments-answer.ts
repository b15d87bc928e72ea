import 'server-only'
import { DomainError, httpStatus } from '@/lib/errors'
import { read } from '@/lib/server/read'
import { revisionComments } from '@/lib/server/reviews/queries'
import { currentActor } from '@/lib/server/session'
import type { CommentsView } from '@/lib/study/review-view'

/** The comments of a revision for whoever asks outside a page; a refusal is its sentence with its status. */
export async function commentsAnswer(revisionId: string, make: (view: CommentsView) => Response): Promise<Response> {
  const actor = await currentActor()
  if (!actor) return new Response('Sign in first.', { status: 401 })
  try {
    return make(await read(revisionComments, actor, { revisionId }))
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    return new Response(error.message, { status: httpStatus[error.code] })
  }
}
