import { beforeAll, describe, expect, test } from 'vitest'
import { type ChainedEvent, eventHash } from '@/lib/server/audit'
import { database, type Tx } from '@/lib/server/db'
import { perform } from '@/lib/server/perform'
import { addRecord, changeRecord, removeRecord } from '@/lib/server/plants/commands'
import { plantRecords } from '@/lib/server/plants/queries'
import { read } from '@/lib/server/read'
import { addStudyRecord, stopComputing } from '@/lib/server/studies/commands'
import { studyView } from '@/lib/server/studies/queries'
import type { AuditEvent } from '@/prisma/generated/client'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from './support/cast-actor'
import { breakOf, chainOf } from './support/chain'
import { useDemo } from './support/demo'

useDemo()

const { projectId, studyId } = demo
const engineer = actorAs('engineer')

beforeAll(async () => {
  const { capacitor } = (await read(plantRecords, engineer, { projectId })).rows
  const { id: _id, ...like } = capacitor[0]!.values
  const kind = 'capacitor' as const
  const { id, version, values } = await perform(addRecord, engineer, {
    projectId,
    kind,
    values: { ...like, tag: 'K9' },
  })
  const note = 'Ω, “quotes” and a new\nline'
  const changed = await perform(changeRecord, engineer, { projectId, kind, id, version, values: { ...values, note } })
  await perform(removeRecord, engineer, { projectId, kind, id, version: changed.version })
  const { rows } = await read(studyView, engineer, { studyId })
  const { id: _case, ...likeACase } = rows.case[0]!.values
  await perform(addStudyRecord, engineer, { studyId, kind: 'case', values: { ...likeACase, tag: 'once more' } })
  await perform(stopComputing, engineer, { studyId })
})

const chain = () => database().$transaction(chainOf)
const whereBroken = () => database().$transaction(breakOf)

/** What becomes of the chain under a change that somebody makes who may do everything to the tables; undone afterwards. */
async function breakUnder(change: (tx: Tx, events: AuditEvent[]) => Promise<unknown>): Promise<number | null> {
  const undone = new Error('undone')
  let answer: number | null = null
  const attempt = database().$transaction(async (tx) => {
    const { events } = await chainOf(tx)
    await tx.$executeRaw`alter table audit_event disable trigger append_only`
    await change(tx, events)
    answer = await breakOf(tx)
    throw undone
  })
  await expect(attempt).rejects.toBe(undone)
  return answer
}

const keyOf = ({ organisationId, scope, sequence }: AuditEvent) => ({
  organisationId_scope_sequence: { organisationId, scope, sequence },
})

describe('the audit chain of a project', () => {
  test('holds after several commands, with one event for each in the order in which they were done', async () => {
    const { events, head } = await chain()
    expect(events.map(({ action }) => action)).toEqual([
      'project-created',
      'study-taken-in',
      'computing-asked',
      'record-added',
      'record-changed',
      'record-removed',
      'record-added',
      'computing-stopped',
    ])
    expect(head).toMatchObject({ sequence: events.length, auditHash: events.at(-1)!.hash })
    expect(await whereBroken()).toBe(null)
  })

  test('says what a change was made from and to', async () => {
    const { events } = await chain()
    expect(events[4]).toMatchObject({
      actorId: engineer.userId,
      actorName: engineer.name,
      subjectKind: 'capacitor',
      payload: { before: { tag: 'K9' }, after: { tag: 'K9', note: 'Ω, “quotes” and a new\nline' } },
    })
  })

  test('gets nothing from a command that is refused', async () => {
    const before = await chain()
    const { bus } = (await read(plantRecords, engineer, { projectId })).rows
    const { id, version } = bus[0]!
    await expect(perform(removeRecord, engineer, { projectId, kind: 'bus', id, version })).rejects.toThrow(/is used by/)
    const client = perform(addRecord, actorAs('client'), { projectId, kind: 'bus', values: bus[0]!.values })
    await expect(client).rejects.toMatchObject({ code: 'forbidden' })
    expect(await chain()).toEqual(before)
  })
})

describe('an event', () => {
  const inTheDemo = (statement: string) =>
    database().$transaction(async (tx) => {
      await chainOf(tx)
      return tx.$executeRawUnsafe(statement)
    })

  test.each([
    ['changed', `update audit_event set actor_name = 'nobody'`],
    ['removed', 'delete from audit_event'],
    ['emptied away with all others', 'truncate audit_event'],
  ])('cannot be %s', async (_how, statement) => {
    const before = await chain()
    await expect(inTheDemo(statement)).rejects.toThrow(/rows of audit_event are only ever added/)
    expect(await chain()).toEqual(before)
  })

  const altered: [keyof ChainedEvent, Partial<Record<keyof ChainedEvent, string | Date | object | null>>][] = [
    ['action', { action: 'record-removed' }],
    ['actorId', { actorId: 'demo-obede' }],
    ['actorName', { actorName: 'R. Obede' }],
    ['subjectKind', { subjectKind: 'bus' }],
    ['subjectId', { subjectId: 'k1' }],
    ['payload', { payload: { before: {}, after: {} } }],
    ['at', { at: new Date('2026-01-01T00:00:00.000Z') }],
    ['previousHash', { previousHash: 'f'.repeat(64) }],
  ]

  test.each(altered)(
    'altered behind the back of the application in its %s breaks the chain there',
    async (_name, data) => {
      const broken = await breakUnder((tx, events) =>
        tx.auditEvent.update({ where: keyOf(events[4]!), data: data as object }),
      )
      expect(broken).toBe(5)
    },
  )

  test('altered and hashed anew breaks the chain at the next one', async () => {
    const broken = await breakUnder((tx, events) => {
      const forged = { ...events[4]!, actorName: 'R. Obede' }
      const data = { actorName: forged.actorName, hash: eventHash(forged) }
      return tx.auditEvent.update({ where: keyOf(forged), data })
    })
    expect(broken).toBe(6)
  })

  test('taken out of the middle, or off the end, is missed', async () => {
    expect(await breakUnder((tx, events) => tx.auditEvent.delete({ where: keyOf(events[3]!) }))).toBe(4)
    expect(await breakUnder((tx, events) => tx.auditEvent.delete({ where: keyOf(events.at(-1)!) }))).toBe(8)
  })

  test('is where it was after all those attempts', async () => {
    expect(await whereBroken()).toBe(null)
  })
})
