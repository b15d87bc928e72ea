import { type ChildProcess, spawn } from 'node:child_process'
import fs from 'node:fs'
import path from 'node:path'
import { fileURLToPath } from 'node:url'
import { build } from 'esbuild'
import { afterAll, beforeAll, expect, onTestFinished, test } from 'vitest'
import { database } from '@/lib/server/db'
import { perform } from '@/lib/server/perform'
import { changeRecord } from '@/lib/server/plants/commands'
import { plantRecords } from '@/lib/server/plants/queries'
import { read } from '@/lib/server/read'
import { bundleOptions } from '@/lib/start/bundle.mjs'
import { inRoot, root } from '@/lib/start/root.mjs'
import { demo } from '@/prisma/seed/seed-demo'
import { ends, hears } from '../support/run-module'
import { actorAs } from './support/cast-actor'
import { breakOf, chainOf } from './support/chain'
import { useDemo } from './support/demo'

const { url } = useDemo()
const { projectId } = demo
const engineer = actorAs('engineer')

const folder = inRoot('.data', 'test', `own-${crypto.randomUUID()}`)

// a program of its own, made as every program of the application is
beforeAll(async () => {
  const entryPoints = { saving: fileURLToPath(new URL('./support/saving-process.ts', import.meta.url)) }
  await build({ ...bundleOptions(), entryPoints, outdir: folder, write: true })
})
afterAll(() => fs.rmSync(folder, { recursive: true, force: true }))

function savingProcess(how: 'once' | 'on and on'): ChildProcess {
  const child = spawn(process.execPath, [path.join(folder, 'saving.js'), how], {
    cwd: root,
    env: { ...process.env, DATABASE_URL: url() },
    stdio: ['ignore', 'pipe', 'inherit'],
  })
  onTestFinished(() => void child.kill('SIGKILL'))
  return child
}

const capacitor = async () => (await read(plantRecords, engineer, { projectId })).rows.capacitor[0]!

/** Everything that a save writes: the record, the events, the head row. */
const kept = async () => {
  const { events, head } = await database().$transaction(chainOf)
  return { row: await capacitor(), events, sequence: head.sequence, auditHash: head.auditHash }
}

const save = async (note: string) => {
  const { id, version, values } = await capacitor()
  return perform(changeRecord, engineer, { projectId, kind: 'capacitor', id, version, values: { ...values, note } })
}

test('a process killed when half of a save is written leaves nothing of it, and holds up nobody', async () => {
  await save('Kept before.')
  const before = await kept()
  const child = savingProcess('once')
  await hears(child, 'half written')
  expect(await kept()).toEqual(before)

  const waiting = save('Kept after.')
  const first = await Promise.race([waiting.then(() => 'saved'), pause(300).then(() => 'waits for the lock')])
  expect(first).toBe('waits for the lock')
  child.kill('SIGKILL')
  await ends(child)
  const { version } = await waiting
  const after = await kept()
  expect(version).toBe(before.row.version + 1)
  expect(after.row.values.note).toBe('Kept after.')
  expect(after.events.slice(0, -1)).toEqual(before.events)
  expect(await database().$transaction(breakOf)).toBe(null)
})

test('a process killed while it saves on and on loses no save that it was told is kept, and keeps none by half', async () => {
  for (const round of [1, 2, 3, 4, 5, 6]) {
    const before = await kept()
    const child = savingProcess('on and on')
    let said = ''
    child.stdout?.on('data', (part) => {
      said += part
    })
    await hears(child, `kept ${before.row.version + round}`)
    // now here, now there in a save, which takes some ten milliseconds
    await pause(round * 3)
    child.kill('SIGKILL')
    await ends(child)
    const acknowledged = Number(
      said
        .match(/kept (\d+)\n/g)
        ?.at(-1)
        ?.match(/\d+/)?.[0],
    )
    // whatever its last transaction held is undone once this one has the lock
    await save(`Round ${round} is over.`)
    const after = await kept()
    const itsLast = after.row.version - 1
    expect(itsLast === acknowledged || itsLast === acknowledged + 1).toBe(true)
    const events = after.events.slice(before.events.length)
    expect(events.map(({ payload }) => noteIn(payload))).toEqual([
      ...Array.from(
        { length: itsLast - before.row.version },
        (_, index) => `Saved on version ${before.row.version + index}.`,
      ),
      `Round ${round} is over.`,
    ])
    expect(await database().$transaction(breakOf)).toBe(null)
  }
})

const pause = (milliseconds: number) => new Promise<void>((resolve) => setTimeout(resolve, milliseconds))

const noteIn = (payload: unknown): string => (payload as { after: { note: string } }).after.note
