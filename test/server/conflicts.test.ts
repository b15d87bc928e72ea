import { beforeAll, describe, expect, test } from 'vitest'
import { DomainError } from '@/lib/errors'
import type { Actor } from '@/lib/server/actor'
import { database } from '@/lib/server/db'
import { changeMember } from '@/lib/server/people/member-commands'
import { perform } from '@/lib/server/perform'
import { addRecord, changeRecord, removeRecord } from '@/lib/server/plants/commands'
import { plantRecords } from '@/lib/server/plants/queries'
import { read } from '@/lib/server/read'
import type { ConflictDetail, RecordValues, Row } from '@/lib/server/row'
import { changeStudy } from '@/lib/server/studies/commands'
import { studyView } from '@/lib/server/studies/queries'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from './support/cast-actor'
import { chainOf } from './support/chain'
import { useDemo } from './support/demo'

useDemo()

const { projectId, studyId } = demo
const lindqvar = actorAs('engineer')
const obede = actorAs('checker')

// a second pair of hands on the same records
beforeAll(async () => {
  const roles: ('checker' | 'engineer')[] = ['checker', 'engineer']
  await perform(changeMember, actorAs('administrator'), { projectId, userId: obede.userId, roles })
})

const plant = async () => (await read(plantRecords, lindqvar, { projectId })).rows
const capacitor = async (): Promise<Row<'capacitor'>> => (await plant()).capacitor[0]!

const save = (actor: Actor, { id, version, values }: Row<'capacitor'>, note: string) =>
  perform(changeRecord, actor, { projectId, kind: 'capacitor', id, version, values: { ...values, note } })

const refusalOf = async (attempt: Promise<unknown>): Promise<DomainError> => {
  const outcome = await attempt.then(
    () => null,
    (error: unknown) => error,
  )
  if (outcome instanceof DomainError) return outcome
  throw new Error(`not refused: ${String(outcome)}`)
}

describe('a record that somebody else has changed meanwhile', () => {
  test('is not overwritten: the refusal says whose change came first and holds what it left', async () => {
    const asRead = await capacitor()
    const theirs = await save(obede, asRead, 'Switched by the pump controller.')
    const refusal = await refusalOf(save(lindqvar, asRead, 'In service with three pumps.'))
    expect(refusal.code).toBe('conflict')
    expect(refusal.message).toContain('R. Obede has changed this meanwhile')
    expect(refusal.detail).toEqual({
      by: 'R. Obede',
      at: theirs.changedAt,
      version: asRead.version + 1,
      theirs: { ...asRead.values, note: 'Switched by the pump controller.' },
    })
    expect(await capacitor()).toEqual(theirs)
  })

  test('is saved once both sides were seen, and by nobody else in between', async () => {
    const seen = await capacitor()
    const saved = await save(lindqvar, seen, 'In service with three pumps.')
    expect(saved).toMatchObject({ version: seen.version + 1, changedBy: 'A. Lindqvar' })
    expect(await capacitor()).toEqual(saved)
  })

  test('is not removed on the strength of what it was before', async () => {
    const asRead = await capacitor()
    await save(obede, asRead, 'Changed before the removal.')
    const { id, version } = asRead
    const refusal = await refusalOf(perform(removeRecord, lindqvar, { projectId, kind: 'capacitor', id, version }))
    expect(refusal).toMatchObject({ code: 'conflict', detail: { by: 'R. Obede' } })
    expect((await capacitor()).values.note).toBe('Changed before the removal.')
  })

  test('the same holds for the head and texts of a study', async () => {
    const asRead = await read(studyView, lindqvar, { studyId })
    const change = (actor: Actor, title: string) =>
      perform(changeStudy, actor, { studyId, version: asRead.version, head: { ...asRead.head, title } })
    await change(obede, 'As Obede calls it')
    const refusal = await refusalOf(change(lindqvar, 'As Lindqvar calls it'))
    expect(refusal).toMatchObject({ code: 'conflict', detail: { by: 'R. Obede' } })
    expect(refusal.detail).toHaveProperty('theirs.head.title', 'As Obede calls it')
    expect((await read(studyView, lindqvar, { studyId })).head.title).toBe('As Obede calls it')
  })
})

describe('changes of one record at the same time', () => {
  test('of one version: one is kept, every other is refused with what was kept', async () => {
    const asRead = await capacitor()
    const attempts = Array.from({ length: 6 }, (_, index) =>
      save(index % 2 ? obede : lindqvar, asRead, `Attempt ${index}`),
    )
    const outcomes = await Promise.allSettled(attempts)
    const kept = outcomes.filter((one) => one.status === 'fulfilled')
    expect(kept).toHaveLength(1)
    const after = await capacitor()
    expect(after).toEqual(kept[0]!.value)
    expect(after.version).toBe(asRead.version + 1)
    for (const one of outcomes) {
      if (one.status === 'fulfilled') continue
      expect(one.reason).toMatchObject({ code: 'conflict', detail: { theirs: after.values, version: after.version } })
    }
  })

  test('each made anew on what came first: none is lost, and each is one event', async () => {
    const before = await capacitor()
    const eventsBefore = (await database().$transaction(chainOf)).events.length
    const words = ['one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight']
    await save(lindqvar, before, 'said:')
    await Promise.all(words.map((word, index) => insist(index % 2 ? obede : lindqvar, word)))
    const after = await capacitor()
    const said = after.values.note?.split(' ').slice(1)
    expect(said?.toSorted()).toEqual(words.toSorted())
    expect(after.version).toBe(before.version + 1 + words.length)
    expect((await database().$transaction(chainOf)).events).toHaveLength(eventsBefore + 1 + words.length)
  })

  /** Adds a word to the note, on top of whatever the refusals bring back. */
  async function insist(actor: Actor, word: string): Promise<void> {
    let row = await capacitor()
    for (;;) {
      try {
        await save(actor, row, `${row.values.note} ${word}`)
        return
      } catch (error) {
        if (!(error instanceof DomainError) || error.code !== 'conflict') throw error
        const { version, theirs } = error.detail as ConflictDetail<RecordValues<'capacitor'>>
        row = { ...row, version, values: theirs }
      }
    }
  }
})

describe('a bus', () => {
  test('in use stays, and the refusal lists every record that stands at it', async () => {
    const { bus, line, supply } = await plant()
    const { id, version } = bus.find(({ values }) => values.tag === 'PCC')!
    const refusal = await refusalOf(perform(removeRecord, lindqvar, { projectId, kind: 'bus', id, version }))
    expect(refusal.code).toBe('conflict')
    expect(refusal.message).toMatch(/^PCC is used by .*: change or remove those first\.$/)
    const { usedIn } = refusal.detail as { usedIn: { kind: string; id: string; tag: string }[] }
    for (const { id, values } of supply.filter((row) => row.values.bus === 'pcc')) {
      expect(usedIn).toContainEqual({ kind: 'supply', id, tag: values.tag })
    }
    for (const { id, values } of line.filter((row) => row.values.from === 'pcc')) {
      expect(usedIn).toContainEqual({ kind: 'line', id, tag: values.tag })
    }
    expect(usedIn.filter(({ kind }) => kind === 'supply' || kind === 'line').length).toBeGreaterThan(1)
    expect((await plant()).bus).toHaveLength(bus.length)
  })

  test('that is removed while a capacitor is put at it: one of the two is refused, nothing hangs in the air', async () => {
    const { bus, capacitor: capacitors } = await plant()
    // without their identities, so that each gets a new one
    const { id: _bus, ...likeABus } = bus[0]!.values
    const { id: _capacitor, ...likeACapacitor } = capacitors[0]!.values
    for (let round = 0; round < 5; round += 1) {
      const tag = `SPARE ${round}`
      const { id, version } = await perform(addRecord, lindqvar, {
        projectId,
        kind: 'bus',
        values: { ...likeABus, tag },
      })
      const values = { ...likeACapacitor, tag, bus: id }
      const outcomes = await Promise.allSettled([
        perform(removeRecord, lindqvar, { projectId, kind: 'bus', id, version }),
        perform(addRecord, obede, { projectId, kind: 'capacitor', values }),
      ])
      const refused = outcomes.filter((one) => one.status === 'rejected')
      expect(refused).toHaveLength(1)
      expect(refused[0]!.reason).toBeInstanceOf(DomainError)
      const after = await plant()
      const removed = outcomes[0].status === 'fulfilled'
      expect(after.bus.some((row) => row.id === id)).toBe(!removed)
      expect(after.capacitor.some((row) => row.values.bus === id)).toBe(!removed)
    }
  })
})
