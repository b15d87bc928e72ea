import { beforeAll, describe, expect, test } from 'vitest'
import type { Actor } from '@/lib/server/actor'
import { liveStream } from '@/lib/server/live/stream'
import { perform } from '@/lib/server/perform'
import { changeRecord } from '@/lib/server/plants/commands'
import { read } from '@/lib/server/read'
import { addComment } from '@/lib/server/reviews/commands'
import { decideCheck, freezeRevision, sendForCheck } from '@/lib/server/revisions/commands'
import { revisionView } from '@/lib/server/revisions/queries'
import { studyView } from '@/lib/server/studies/queries'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from '../support/cast-actor'
import { useDemo } from '../support/demo'
import { computed } from '../support/path-to-signing'
import { until, useWorker } from '../support/worker'

const { url } = useDemo()
const worker = useWorker(url)
const { projectId, studyId } = demo

interface Said {
  id: number | null
  event: string
  data: unknown
}

/** An open page: what it has been told so far, and a way to close it. */
async function page(actor: Actor, after: number | null = null, where = '') {
  const closing = new AbortController()
  const whoIs = async () => actor
  const body = await liveStream(actor, { projectId, after, where, whoIs, signal: closing.signal })
  const said: Said[] = []
  const text = new TextDecoder()
  const reader = body.getReader()
  void (async () => {
    for (;;) {
      const { value, done } = await reader.read()
      if (done) return
      for (const piece of text.decode(value).split('\n\n')) {
        const event = /^event: (.*)$/m.exec(piece)?.[1]
        const id = /^id: (.*)$/m.exec(piece)?.[1]
        const data = /^data: (.*)$/m.exec(piece)?.[1]
        if (event && data) said.push({ id: id ? Number(id) : null, event, data: JSON.parse(data) })
      }
    }
  })()
  const happened = () =>
    said.filter(({ event }) => event === 'happened').map(({ data }) => (data as { action: string }).action)
  const lastId = () => said.findLast(({ id }) => id !== null)?.id ?? null
  return { said, happened, lastId, close: () => closing.abort() }
}

const heard = async (one: Awaited<ReturnType<typeof page>>, action: string) =>
  until(
    async () => one.happened(),
    (actions) => actions.includes(action),
  )
/** Writes a note on the demo's capacitor bank, which nothing computed depends on. */
const writeNote = async (note: string) => {
  const { id, version, values } = (await read(studyView, actorAs('engineer'), { studyId })).plant.capacitor[0]!
  const change = { projectId, kind: 'capacitor' as const, id, version, values: { ...values, note } }
  await perform(changeRecord, actorAs('engineer'), change)
}

beforeAll(async () => {
  await worker.start()
  await computed()
}, 120_000)

describe.sequential('an open page', () => {
  let revisionId = ''

  test('is told of what others do, without the text of it', async () => {
    const open = await page(actorAs('checker'))
    await writeNote('B-91')
    await heard(open, 'record-changed')
    const told = open.said.find(({ event }) => event === 'happened')
    expect(told?.data).toMatchObject({ action: 'record-changed', by: 'A. Lindqvar', own: false })
    expect(JSON.stringify(told)).not.toContain('B-91')
    open.close()
  })

  test('misses nothing between the page that was made and the connection that follows', async () => {
    const first = await page(actorAs('checker'))
    await until(
      async () => first.lastId(),
      (id) => id !== null,
    )
    const seen = first.lastId()!
    first.close()
    await writeNote('B-92')
    await writeNote('B-93')
    const again = await page(actorAs('checker'), seen)
    await until(
      async () => again.happened(),
      (actions) => actions.length >= 2,
    )
    expect(again.happened()).toEqual(['record-changed', 'record-changed'])
    expect(again.lastId()).toBe(seen + 2)
    again.close()
  })

  test('tells a guest only of revisions that are out for review', async () => {
    revisionId = (await perform(freezeRevision, actorAs('engineer'), { studyId })).revisionId
    const guest = await page(actorAs('commenter'))
    const client = await page(actorAs('client'))
    const own = await page(actorAs('engineer'))
    await perform(sendForCheck, actorAs('engineer'), { revisionId })
    const input = { revisionId, anchor: 'revision', kind: 'question' as const, text: 'Between us.' }
    await perform(addComment, actorAs('checker'), input)
    await heard(own, 'comment-made')
    expect(guest.happened()).toEqual([])
    await perform(decideCheck, actorAs('checker'), { revisionId, accepted: true })
    await heard(guest, 'revision-accept-check')
    await perform(addComment, actorAs('approver'), input)
    await heard(guest, 'comment-made')
    // what a worker finishes meanwhile concerns the revision too
    const told = guest.happened().filter((action) => !action.startsWith('report-'))
    expect(told).toEqual(['revision-accept-check', 'comment-made'])
    expect(client.happened()).toEqual([])
    for (const one of [guest, client, own]) one.close()
  })

  test('shows who else looks, but neither to clients nor clients', async () => {
    const engineer = await page(actorAs('engineer'), null, `revision/${revisionId}`)
    const client = await page(actorAs('client'))
    const checker = await page(actorAs('checker'), null, 'study/x')
    const names = (one: typeof engineer) => {
      const last = one.said.findLast(({ event }) => event === 'present')?.data
      return Array.isArray(last) ? last.map(({ name }) => name) : null
    }
    await until(
      async () => names(engineer),
      (now) => now?.includes('R. Obede') ?? false,
    )
    expect(names(engineer)).toEqual(['R. Obede'])
    expect(names(client)).toBeNull()
    checker.close()
    await until(
      async () => names(engineer),
      (now) => now?.length === 0,
    )
    engineer.close()
    client.close()
  })

  test('starts from where the page was made', async () => {
    const { sequence } = await read(revisionView, actorAs('engineer'), { revisionId })
    const open = await page(actorAs('engineer'), sequence)
    await until(
      async () => open.said,
      (said) => said.some(({ event }) => event === 'standing'),
    )
    expect(open.happened()).toEqual([])
    open.close()
  })
})

test('nobody follows a project without a part in it', async () => {
  const stranger: Actor = { userId: 'stranger', name: 'T. Elsewhere', email: 't@elsewhere.example' }
  await expect(page(stranger)).rejects.toMatchObject({ code: 'not-found' })
})
