import { DomainError, httpStatus } from '@/lib/errors'
import { currentActor } from '@/lib/server/session'
import { timelineFile } from '@/lib/server/timeline/timeline-file'

export async function GET(_request: Request, { params }: RouteContext<'/projects/[projectId]/timeline/file'>) {
  const { projectId } = await params
  const actor = await currentActor()
  if (!actor) return new Response('Sign in first.', { status: 401 })
  try {
    return new Response(await timelineFile(actor, projectId), {
      headers: {
        'content-type': 'text/csv; charset=utf-8',
        'content-disposition': 'attachment; filename="timeline.csv"',
        'cache-control': 'no-store',
      },
    })
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    return new Response(error.message, { status: httpStatus[error.code] })
  }
}
