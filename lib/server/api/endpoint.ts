import 'server-only'
import type * as z from 'zod'
import { DomainError } from '@/lib/errors'
import type { Actor } from '../actor'
import { parseInput } from '../parse-input'
import { actorOf } from '../session'
import { answer } from './answer'
import { readBody, readJson } from './read-body'
import { requireSameOrigin } from './same-origin'

/** A JSON body of a route holds at most this many octets. */
const jsonLimit = 2 ** 20

const noStore = { 'cache-control': 'no-store' }

async function signedIn(request: Request): Promise<Actor> {
  const actor = await actorOf(request.headers)
  if (!actor) throw new DomainError('not-signed-in', 'Your session has ended: sign in again, then repeat this.')
  return actor
}

/** A route that takes JSON from a signed-in person and answers JSON. */
export const endpoint =
  <Shape extends z.ZodType>(body: Shape, handle: (actor: Actor, input: z.output<Shape>) => Promise<object>) =>
  (request: Request): Promise<Response> =>
    answer(async () => {
      requireSameOrigin(request)
      const actor = await signedIn(request)
      const input = parseInput(body, await readJson(request, jsonLimit))
      return Response.json(await handle(actor, input), { headers: noStore })
    })

/** A route that takes a file from anybody and answers JSON. */
export const openUpload =
  (limit: number, handle: (bytes: Uint8Array<ArrayBuffer>) => Promise<object>) =>
  (request: Request): Promise<Response> =>
    answer(async () => {
      requireSameOrigin(request)
      return Response.json(await handle(await readBody(request, limit)), { headers: noStore })
    })

/** A route that gives a file to a signed-in person. */
export const download = (
  request: Request,
  open: (actor: Actor) => Promise<{ name: string; bytes: Uint8Array<ArrayBuffer>; type: string }>,
): Promise<Response> =>
  answer(async () => {
    const { name, bytes, type } = await open(await signedIn(request))
    return new Response(bytes, {
      headers: {
        ...noStore,
        'content-type': type,
        'content-length': String(bytes.length),
        'content-disposition': `attachment; filename="${name.replace(/[^A-Za-z0-9._-]/g, '-')}"`,
      },
    })
  })
