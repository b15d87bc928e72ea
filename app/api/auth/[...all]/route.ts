import { auth } from '@/lib/server/auth'

/** Nothing that is asked here is longer; more is refused before it is read. */
const mostOctets = 64 * 1024

const handler = (request: Request): Promise<Response> => auth().handler(request)

const bounded = async (request: Request): Promise<Response> => {
  const length = Number(request.headers.get('content-length') ?? Number.NaN)
  if (Number.isNaN(length)) return new Response('Say how long the request is.', { status: 411 })
  if (length > mostOctets) return new Response('This request is too long.', { status: 413 })
  return handler(request)
}

export { bounded as POST, handler as GET }
