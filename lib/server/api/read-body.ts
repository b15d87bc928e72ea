import 'server-only'
import { DomainError } from '@/lib/errors'

const megabytes = (bytes: number): string => `${Math.round((bytes / 2 ** 20) * 10) / 10} MB`

const tooLarge = (limit: number) =>
  new DomainError(
    'too-large',
    `This is larger than the ${megabytes(limit)} that are taken here: choose a smaller file.`,
  )

/**
 * Reads a request's body up to a limit. A length that is announced too large is refused at once; one that is not announced, or
 * announced wrongly, is counted as it comes in and cut off.
 */
export async function readBody(request: Request, limit: number): Promise<Uint8Array<ArrayBuffer>> {
  if (Number(request.headers.get('content-length') ?? 0) > limit) throw tooLarge(limit)
  if (!request.body) return new Uint8Array()
  const reader = request.body.getReader()
  const pieces: Uint8Array[] = []
  let length = 0
  for (let next = await reader.read(); !next.done; next = await reader.read()) {
    length += next.value.length
    if (length > limit) {
      await reader.cancel()
      throw tooLarge(limit)
    }
    pieces.push(next.value)
  }
  return new Uint8Array(Buffer.concat(pieces))
}

/** A body in JSON. Anything else is refused, so that a form of another site cannot send one without the browser asking first. */
export async function readJson(request: Request, limit: number): Promise<unknown> {
  const type = request.headers.get('content-type')?.split(';')[0]?.trim().toLowerCase()
  if (type !== 'application/json') throw new DomainError('unsupported', 'Send this as application/json.')
  const text = new TextDecoder('utf-8', { fatal: true })
  try {
    return JSON.parse(text.decode(await readBody(request, limit)))
  } catch (error) {
    if (error instanceof DomainError) throw error
    throw new DomainError('invalid', 'The body is not written as JSON.')
  }
}
