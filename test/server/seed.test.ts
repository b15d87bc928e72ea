import fs from 'node:fs'
import path from 'node:path'
import { expect, test } from 'vitest'
import { readKeyFile } from '@/app/(account)/_signing/key-file'
import { openSigningKey } from '@/app/(account)/_signing/signing-key'
import { myCertificate, myProjects } from '@/lib/server/people/queries'
import { plantRecords } from '@/lib/server/plants/queries'
import { read } from '@/lib/server/read'
import { studyView } from '@/lib/server/studies/queries'
import { cast } from '@/prisma/seed/cast'
import { demo, seedDemo } from '@/prisma/seed/seed-demo'
import { ownFolder } from '../support/own-folder'
import { useServer } from './support/server'

useServer()

const actor = (role: string) => {
  const member = cast.find((one) => one.role === role)!
  return { userId: member.id, name: member.name, email: member.email }
}

test('the demo plant is seeded once, with people, keys that open and a study that can be computed', async () => {
  const secrets = path.join(ownFolder(), 'demo-people.json')
  expect(await seedDemo(secrets)).toBe(true)
  expect(await seedDemo(secrets)).toBe(false)

  expect(fs.statSync(secrets).mode & 0o777).toBe(0o600)
  const { people } = JSON.parse(fs.readFileSync(secrets, 'utf8'))
  expect(people).toHaveLength(cast.length)
  const engineer = people[0]
  expect(fs.statSync(engineer.keyFile).mode & 0o777).toBe(0o600)
  await openSigningKey(readKeyFile(fs.readFileSync(engineer.keyFile, 'utf8')), engineer.passphrase)

  expect(await read(myCertificate, actor('engineer'), {})).toMatchObject({ subject: { name: 'A. Lindqvar' } })
  expect(await read(myCertificate, actor('client'), {})).toBe(null)
  const { rows } = await read(plantRecords, actor('engineer'), { projectId: demo.projectId })
  expect(rows.motor).toHaveLength(5)
  const view = await read(studyView, actor('engineer'), { studyId: demo.studyId })
  expect(view.problems).toEqual([])
  expect(view.run).toMatchObject({ state: 'queued', of: view.rows.case.length, result: null })
})

test('a client sees the project and no study before a revision is issued; the utility neither', async () => {
  for (const role of ['client', 'commenter']) {
    expect(await read(myProjects, actor(role), {})).toMatchObject([
      { name: 'Velmoor raw-water pumping station', studies: [] },
    ])
    await expect(read(studyView, actor(role), { studyId: demo.studyId })).rejects.toMatchObject({ code: 'forbidden' })
  }
})
