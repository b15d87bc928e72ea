import { DomainError, httpStatus } from '@/lib/errors'
import { liveStream } from '@/lib/server/live/stream'
import { actorOf } from '@/lib/server/session'

export const dynamic = 'force-dynamic'

/** The last event that the browser has seen: from its own reconnecting, else from the page that it was told with. */
const lastSeen = (request: Request, query: URLSearchParams): number | null => {
  const said = request.headers.get('last-event-id') || query.get('after')
  const sequence = Number(said)
  return said && Number.isSafeInteger(sequence) && sequence >= 0 ? sequence : null
}

export async function GET(request: Request, { params }: RouteContext<'/api/live/[projectId]'>): Promise<Response> {
  const { projectId } = await params
  const query = new URL(request.url).searchParams
  const { headers, signal } = request
  const actor = await actorOf(headers)
  if (!actor) return new Response('Sign in first.', { status: 401 })
  const where = /^(revision|study)\/[\w-]{1,64}$/.test(query.get('where') ?? '') ? (query.get('where') ?? '') : ''
  try {
    const after = lastSeen(request, query)
    const whoIs = () => actorOf(headers)
    const body = await liveStream(actor, { projectId, after, where, whoIs, signal })
    return new Response(body, {
      headers: {
        'content-type': 'text/event-stream; charset=utf-8',
        // neither kept, nor compressed, nor gathered on the way
        'cache-control': 'no-store, no-transform',
        'x-accel-buffering': 'no',
      },
    })
  } catch (error) {
    if (!(error instanceof DomainError)) throw error
    return new Response(error.message, { status: httpStatus[error.code] })
  }
}
