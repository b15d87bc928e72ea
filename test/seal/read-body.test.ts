import { describe, expect, it } from 'vitest'
import { readBody } from '@/app/verify/check/read-body'
import { uploadLimit } from '@/app/verify/upload-limit'
import { verificationLimits } from '@/lib/seal/verification-limits'

const address = 'http://127.0.0.1/verify/check'

/** A body that is never announced: pieces of a mebibyte, and a count of how many were asked for. */
function endless() {
  let given = 0
  const body = new ReadableStream<Uint8Array>({
    pull(controller) {
      given += 1
      controller.enqueue(new Uint8Array(2 ** 20))
    },
  })
  const request = new Request(address, { method: 'POST', body, duplex: 'half' } as RequestInit)
  return { request, given: () => given }
}

describe('a file sent to be checked', () => {
  it('is read whole', async () => {
    const request = new Request(address, { method: 'POST', body: new Uint8Array([1, 2, 3]) })
    expect([...(await readBody(request))]).toEqual([1, 2, 3])
    expect((await readBody(new Request(address, { method: 'POST' }))).length).toBe(0)
  })

  it('is refused by the announced size before a byte is read', async () => {
    const { request, given } = endless()
    request.headers.set('content-length', String(100 * 2 ** 20))
    await expect(readBody(request)).rejects.toMatchObject({ code: 'too-large' })
    expect(given()).toBeLessThan(2)
  })

  it('is refused as soon as more arrives than the limit, announced or not', async () => {
    const { request, given } = endless()
    await expect(readBody(request)).rejects.toMatchObject({ code: 'too-large' })
    expect(given()).toBeLessThan(24)
  })

  it('is held to the same limit as the check itself', () => {
    expect(uploadLimit).toBe(verificationLimits.bytes)
  })
})
