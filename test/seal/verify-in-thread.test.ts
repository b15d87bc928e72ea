import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { build } from 'esbuild'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { signOffFields } from '@/lib/seal/sign-off-fields'
import { verifyInThread } from '@/lib/seal/verify-in-thread'
import { makeSigner, makeTestAuthority } from './support/people'
import { reportToSign, signInTurn, study } from './support/report'

let folder: string
let entry: string
const context = {
  registered: [],
  listed: [],
  expected: signOffFields.map(({ name }) => name),
  now: new Date('2026-06-01T00:00:00Z'),
}

/** Writes a thread entry that does something else than check. */
const otherEntry = (name: string, code: string) => {
  writeFileSync(path.join(folder, name), code)
  return path.join(folder, name)
}

beforeAll(async () => {
  // Inside the project, so that the bundle finds the packages that it does not contain.
  folder = mkdtempSync(path.resolve('node_modules', '.seal-thread-'))
  entry = path.join(folder, 'verify.worker.mjs')
  await build({
    entryPoints: ['lib/seal/verify.worker.ts'],
    outfile: entry,
    bundle: true,
    platform: 'node',
    format: 'esm',
    target: 'node20',
    packages: 'external',
    logLevel: 'error',
  })
})
afterAll(() => rmSync(folder, { recursive: true }))

describe('a check in its own thread', () => {
  it('gives the verdict and the study', async () => {
    const authority = await makeTestAuthority()
    const signer = await makeSigner(authority, 'Marit Solberg', '51')
    const [signed] = await signInTurn(await reportToSign(), authority, [signer])
    const listed = [{ certificate: signer.certificate, listedAt: new Date('2026-03-01T00:00:00Z') }]
    const checked = await verifyInThread(signed!, { ...context, listed }, { entry })
    expect(checked.verdict).toMatchObject({ overall: 'incomplete', signatures: [{ stands: true, trust: 'trusted' }] })
    expect(checked.study).toBe(study)
  })

  it('refuses a file beyond 20 MB without starting', async () => {
    await expect(
      verifyInThread(new Uint8Array(20 * 2 ** 20 + 1), context, { entry: '/nowhere' }),
    ).rejects.toMatchObject({ code: 'too-large' })
  })

  it('is ended when it takes too long or too much memory, and the next check runs', async () => {
    const endless = otherEntry('endless.mjs', 'for (;;);')
    await expect(
      verifyInThread(new Uint8Array(), context, { entry: endless, milliseconds: 200 }),
    ).rejects.toMatchObject({ code: 'too-large' })
    const greedy = otherEntry('greedy.mjs', 'const all = []; for (;;) all.push(Array(1000).fill({}))')
    await expect(
      verifyInThread(new Uint8Array(), context, { entry: greedy, milliseconds: 30_000, heapMegabytes: 32 }),
    ).rejects.toThrow(/more memory/)
    expect((await verifyInThread(new Uint8Array(), context, { entry })).verdict.overall).toBe('unreadable')
  })

  it('keeps a short queue and refuses what does not fit', async () => {
    const slow = otherEntry(
      'slow.mjs',
      'import { parentPort } from "node:worker_threads"; setTimeout(() => parentPort.postMessage({}), 100)',
    )
    const results = await Promise.allSettled(
      Array.from({ length: 20 }, () => verifyInThread(new Uint8Array(), context, { entry: slow })),
    )
    expect(results.filter((result) => result.status === 'fulfilled')).toHaveLength(18)
    const refused = results.flatMap((result) => (result.status === 'rejected' ? [result.reason] : []))
    expect(refused).toHaveLength(2)
    for (const reason of refused) expect(reason).toMatchObject({ code: 'too-many' })
  })

  it('passes on a defect of ours instead of blaming the file', async () => {
    const defect = otherEntry('defect.mjs', 'throw new TypeError("a bug")')
    await expect(verifyInThread(new Uint8Array(), context, { entry: defect })).rejects.toThrow('a bug')
    const silent = otherEntry('silent.mjs', '')
    await expect(verifyInThread(new Uint8Array(), context, { entry: silent })).rejects.toThrow('without a result')
  })
})
