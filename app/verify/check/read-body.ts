import { DomainError } from '@/lib/errors'
import { tooLarge, uploadLimit } from '../upload-limit'

/** Reads the body of a request while counting: `too-large` as soon as it is announced or found to be beyond the limit. */
export async function readBody(request: Request): Promise<Uint8Array> {
  if (Number(request.headers.get('content-length') ?? 0) > uploadLimit) throw new DomainError('too-large', tooLarge)
  const pieces: Uint8Array[] = []
  let size = 0
  const reader = request.body?.getReader()
  for (let next = await reader?.read(); next && !next.done; next = await reader?.read()) {
    size += next.value.length
    if (size > uploadLimit) {
      await reader?.cancel()
      throw new DomainError('too-large', tooLarge)
    }
    pieces.push(next.value)
  }
  return new Uint8Array(Buffer.concat(pieces))
}
