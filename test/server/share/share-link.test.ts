import { createHash } from 'node:crypto'
import { beforeAll, describe, expect, test } from 'vitest'
import * as shareFile from '@/app/(client)/share/[token]/file/route'
import { POST } from '@/app/(client)/share/[token]/file/route'
import { database, type Tx } from '@/lib/server/db'
import { enterAsJob } from '@/lib/server/enter'
import { perform } from '@/lib/server/perform'
import { read } from '@/lib/server/read'
import { issueRevision, withdrawRevision } from '@/lib/server/revisions/commands'
import { reportFile } from '@/lib/server/revisions/report-file'
import { endShare, shareReport } from '@/lib/server/share/commands'
import { downloadShared } from '@/lib/server/share/download-shared'
import { openShare } from '@/lib/server/share/open-share'
import { shareLinks } from '@/lib/server/share/queries'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from '../support/cast-actor'
import { breakOf } from '../support/chain'
import { useDemo } from '../support/demo'
import { bringToSigning, computed } from '../support/path-to-signing'
import { signAs } from '../support/signing'
import { useWorker } from '../support/worker'

const { url, keyOf } = useDemo()
const worker = useWorker(url)
const engineer = actorAs('engineer')
const nobody = { ipAddress: null, userAgent: null }
const dead = { code: 'not-found', message: expect.stringMatching(/^This link leads nowhere/) }
let revisionId = ''

const wanted = (more: { mostDownloads?: number; passphrase?: string } = {}) => ({
  revisionId,
  recipient: 'Velmoor Water Board',
  days: 30,
  mostDownloads: null,
  ...more,
})

const asDemo = <T>(work: (tx: Tx) => Promise<T>) =>
  database().$transaction(async (tx) => {
    await enterAsJob(tx, demo.organisationId)
    return work(tx)
  })

const countOf = async (shareId: string) => {
  const line = (await read(shareLinks, engineer, { revisionId })).find((one) => one.shareId === shareId)
  return { counted: line?.downloads, logged: line?.log.length }
}

const posted = (token: string, passphrase: string | null, more: Record<string, string> = {}) =>
  POST(
    new Request(`http://127.0.0.1:3000/share/${token}/file`, {
      method: 'POST',
      headers: { 'content-type': 'application/x-www-form-urlencoded', ...more },
      body: passphrase === null ? '' : new URLSearchParams({ passphrase }),
    }),
    { params: Promise.resolve({ token }) },
  )

beforeAll(async () => {
  await worker.start()
  await computed()
  revisionId = await bringToSigning()
  await expect(perform(shareReport, engineer, wanted())).rejects.toMatchObject({ code: 'forbidden' })
  await signAs(engineer, revisionId, 'prepared', await keyOf('engineer'))
  await signAs(actorAs('checker'), revisionId, 'checked', await keyOf('checker'))
  await signAs(actorAs('approver'), revisionId, 'approved', await keyOf('approver'))
  await perform(issueRevision, actorAs('approver'), { revisionId })
}, 180_000)

describe.sequential('a link to an issued report', () => {
  test('shows a page however often it is opened, and counts nothing', async () => {
    const { shareId, token } = await perform(shareReport, engineer, wanted({ mostDownloads: 1 }))
    for (let time = 0; time < 5; time += 1) {
      expect(await openShare(token)).toMatchObject({ state: 'issued', downloadsLeft: 1, asksPassphrase: false })
    }
    expect(await countOf(shareId)).toEqual({ counted: 0, logged: 0 })
    // the address of the file answers to the button alone
    expect(Object.keys(shareFile)).not.toContain('GET')
  })

  test('hands out the signed file unaltered, counts and logs it', async () => {
    const { shareId, token } = await perform(shareReport, engineer, wanted())
    const answer = await posted(token, null)
    expect(answer.status).toBe(200)
    expect(answer.headers.get('content-disposition')).toMatch(/^attachment/)
    expect(answer.headers.get('cache-control')).toContain('no-store')
    const bytes = new Uint8Array(await answer.arrayBuffer())
    const issued = await reportFile(actorAs('client'), revisionId)
    expect(createHash('sha256').update(bytes).digest('hex')).toBe(issued.sha256)
    expect(await countOf(shareId)).toEqual({ counted: 1, logged: 1 })
    expect(await asDemo(breakOf)).toBeNull()
  })

  test('gives no more than its downloads, also when many ask at once', async () => {
    const { shareId, token } = await perform(shareReport, engineer, wanted({ mostDownloads: 2 }))
    const tries = await Promise.allSettled(Array.from({ length: 5 }, () => downloadShared(token, '', nobody)))
    expect(tries.filter(({ status }) => status === 'fulfilled')).toHaveLength(2)
    expect(await countOf(shareId)).toEqual({ counted: 2, logged: 2 })
    const answer = await posted(token, null)
    expect([answer.status, answer.headers.get('location')]).toEqual([303, `/share/${token}?refused=used`])
    expect(await openShare(token)).toMatchObject({ downloadsLeft: 0 })
  })

  test('with a passphrase opens to who knows it, and guessing is held back', async () => {
    const passphrase = 'quiet river stone'
    const { shareId, token } = await perform(shareReport, engineer, wanted({ passphrase }))
    expect(await openShare(token)).toMatchObject({ asksPassphrase: true })
    const where: (string | null)[] = []
    for (let guess = 0; guess < 6; guess += 1) {
      where.push((await posted(token, `guess number ${guess}`)).headers.get('location'))
    }
    expect(where.slice(0, 5)).toEqual(Array.from({ length: 5 }, () => `/share/${token}?refused=passphrase`))
    expect(where[5]).toBe(`/share/${token}?refused=waiting`)
    // the right one waits too: otherwise the answer would tell
    expect((await posted(token, passphrase)).headers.get('location')).toBe(`/share/${token}?refused=waiting`)
    await database().signInDelay.deleteMany({})
    expect((await posted(token, passphrase)).status).toBe(200)
    expect(await countOf(shareId)).toEqual({ counted: 1, logged: 1 })
    const kept = await asDemo((tx) => tx.shareLink.findMany())
    expect(JSON.stringify(kept)).not.toContain(passphrase)
    expect(JSON.stringify(kept)).not.toContain(token)
  })

  test('is not used up from another site', async () => {
    const { shareId, token } = await perform(shareReport, engineer, wanted())
    for (const from of ['cross-site', 'same-site'])
      expect((await posted(token, null, { 'sec-fetch-site': from })).status, from).toBe(403)
    expect(await countOf(shareId)).toEqual({ counted: 0, logged: 0 })
  })

  test('is told the same once it ended, has run out or never was', async () => {
    const ended = await perform(shareReport, engineer, wanted())
    await perform(endShare, engineer, { revisionId, shareId: ended.shareId })
    const late = await perform(shareReport, engineer, wanted())
    await asDemo((tx) =>
      tx.shareLink.updateMany({ where: { id: late.shareId }, data: { expiresAt: new Date(Date.now() - 1) } }),
    )
    for (const token of [ended.token, late.token, 'x'.repeat(43), '../../etc/passwd']) {
      await expect(openShare(token)).rejects.toMatchObject(dead)
      await expect(downloadShared(token, '', nobody)).rejects.toMatchObject(dead)
      expect((await posted(token, null)).status).toBe(404)
    }
    await expect(openShare('x'.repeat(5000))).rejects.toMatchObject({ code: 'invalid' })
  })

  test('is made and ended by who answers for the project, and nobody else', async () => {
    const { shareId } = await perform(shareReport, actorAs('administrator'), wanted())
    for (const role of ['checker', 'commenter', 'client'] as const) {
      const refused = { code: 'forbidden' }
      await expect(perform(shareReport, actorAs(role), wanted()), role).rejects.toMatchObject(refused)
      await expect(perform(endShare, actorAs(role), { revisionId, shareId }), role).rejects.toMatchObject(refused)
      await expect(read(shareLinks, actorAs(role), { revisionId }), role).rejects.toMatchObject(refused)
    }
  })

  test('keeps its log: no line of it is changed or taken away', async () => {
    const { token } = await perform(shareReport, engineer, wanted())
    await downloadShared(token, '', nobody)
    const log = () => asDemo((tx) => tx.shareDownload.findMany({ orderBy: { id: 'asc' } }))
    const before = await log()
    await expect(asDemo((tx) => tx.shareDownload.updateMany({ data: { sha256: 'another' } }))).rejects.toThrow()
    await expect(asDemo((tx) => tx.shareDownload.deleteMany({}))).rejects.toThrow()
    expect(await log()).toEqual(before)
  })

  test('says that the report was withdrawn, hands it out unaltered all the same, and is not made anew', async () => {
    const { token } = await perform(shareReport, engineer, wanted())
    const before = await downloadShared(token, '', nobody)
    const reason = 'The utility changed its supply.'
    await perform(withdrawRevision, actorAs('approver'), { revisionId, reason })
    expect(await openShare(token)).toMatchObject({ state: 'withdrawn', withdrawn: { reason } })
    expect((await downloadShared(token, '', nobody)).sha256).toBe(before.sha256)
    await expect(perform(shareReport, engineer, wanted())).rejects.toMatchObject({ code: 'forbidden' })
  })
})
