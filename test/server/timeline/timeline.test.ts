import { beforeAll, describe, expect, test } from 'vitest'
import { perform } from '@/lib/server/perform'
import { changeRecord } from '@/lib/server/plants/commands'
import { read } from '@/lib/server/read'
import { studyView } from '@/lib/server/studies/queries'
import { projectTimeline } from '@/lib/server/timeline/queries'
import { timelineFile } from '@/lib/server/timeline/timeline-file'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from '../support/cast-actor'
import { useDemo } from '../support/demo'

useDemo()

const { projectId, studyId } = demo
const look = (more: object = {}) => read(projectTimeline, actorAs('checker'), { projectId, ...more })

beforeAll(async () => {
  for (let round = 0; round < 3; round += 1) {
    const { id, version, values } = (await read(studyView, actorAs('engineer'), { studyId })).plant.capacitor[0]!
    const note = `=1+${round}`
    const change = { projectId, kind: 'capacitor' as const, id, version, values: { ...values, note } }
    await perform(changeRecord, actorAs('engineer'), change)
  }
})

describe('the timeline of a project', () => {
  test('lists what happened, the newest first, down to the head of the chain', async () => {
    const { lines, head, olderThan } = await look()
    expect(lines[0]).toMatchObject({ action: 'record-changed', by: 'A. Lindqvar', hash: head.hash })
    expect(lines.map(({ sequence }) => sequence)).toEqual(lines.map((_, i) => head.sequence - i))
    expect(olderThan).toBeNull()
  })

  test('is narrowed to one kind of event, one person, what came before', async () => {
    const { lines, actions, people } = await look({ action: 'record-changed', by: 'A. Lindqvar' })
    expect(lines.map(({ action }) => action)).toEqual(['record-changed', 'record-changed', 'record-changed'])
    expect(actions).toContain('record-changed')
    expect(people).toContain('A. Lindqvar')
    const second = lines[1]!.sequence
    expect((await look({ before: second, action: 'record-changed' })).lines).toHaveLength(1)
    expect((await look({ by: 'Nobody' })).lines).toEqual([])
  })

  test('is for the team, and goes out whole as a file without a formula', async () => {
    await expect(read(projectTimeline, actorAs('client'), { projectId })).rejects.toMatchObject({ code: 'forbidden' })
    const file = await timelineFile(actorAs('engineer'), projectId)
    const { head } = await look()
    expect(file.trim().split('\r\n')).toHaveLength(head.sequence + 1)
    expect(file).not.toMatch(/(^|,)=/m)
  })
})
