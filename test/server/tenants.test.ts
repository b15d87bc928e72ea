import { beforeAll, describe, expect, test } from 'vitest'
import type { Actor } from '@/lib/server/actor'
import { now } from '@/lib/server/clock'
import { type Database, database, type Tx } from '@/lib/server/db'
import { enter, enterAsJob } from '@/lib/server/enter'
import { createAccount } from '@/lib/server/people/create-account'
import { foundOrganisation } from '@/lib/server/people/found-organisation'
import { inviteMember } from '@/lib/server/people/invite'
import { myProjects } from '@/lib/server/people/queries'
import { perform } from '@/lib/server/perform'
import { changeRecord } from '@/lib/server/plants/commands'
import { plantRecords } from '@/lib/server/plants/queries'
import { read } from '@/lib/server/read'
import { prepareSignature } from '@/lib/server/signoff/commands'
import { studyView } from '@/lib/server/studies/queries'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from './support/cast-actor'
import { useDemo } from './support/demo'
import { bringToSigning, computed } from './support/path-to-signing'
import { signAs } from './support/signing'
import { useWorker } from './support/worker'

const { url, keyOf } = useDemo()
const worker = useWorker(url)

const stranger: Actor = { userId: 'stranger', name: 'T. Elsewhere', email: 't.elsewhere@another-office.example' }
const elsewhere = { id: 'another-office', name: 'Another office' }

// one signature given and one begun, so that every table of the demo holds rows that could leak
beforeAll(async () => {
  await worker.start()
  await computed()
  const revisionId = await bringToSigning()
  await signAs(actorAs('engineer'), revisionId, 'prepared', await keyOf('engineer'))
  await perform(prepareSignature, actorAs('checker'), { revisionId, role: 'checked' })
  await database().$transaction(async (tx) => {
    const account = { ...stranger, id: stranger.userId, password: 'of nobody else here', initialPassword: false }
    await createAccount(tx, account, now())
    await foundOrganisation(tx, stranger, elsewhere, now())
  })
  await withLinks(revisionId)
}, 180_000)

/** An open invitation, and a share link with a download behind it. */
async function withLinks(revisionId: string) {
  const { organisationId, projectId, studyId } = demo
  const invited = { projectId, name: 'N. Newcomer', email: 'n@newcomers.example', guest: false }
  await perform(inviteMember, actorAs('administrator'), { ...invited, roles: ['engineer'] })
  await database().$transaction(async (tx) => {
    await enterAsJob(tx, organisationId)
    const by = { createdById: 'demo-tharow', createdByName: 'S. Tharow', createdAt: now() }
    const link = { organisationId, id: 'link', revisionId, tokenHash: 'a hash', recipient: 'the client', ...by }
    await tx.shareLink.create({ data: { ...link, expiresAt: now() } })
    const comment = { organisationId, projectId, studyId, revisionId, id: 'comment', number: 1, anchor: 'revision' }
    const said = { anchorLabel: 'The revision as a whole', kind: 'question', text: 'Why?', state: 'open' }
    await tx.comment.create({ data: { ...comment, ...said, authorId: 'a', authorName: 'A', at: now() } })
    const below = { organisationId, commentId: 'comment', id: 'below', at: now() }
    const entry = { kind: 'reply', text: 'Because.', position: 1, authorId: 'a', authorName: 'A' }
    await tx.commentEntry.create({ data: { ...below, ...entry } })
    await tx.notice.create({ data: { ...below, userId: 'a', revisionId, kind: 'reply', byName: 'A', excerpt: '' } })
    const tick = { organisationId, revisionId, anchor: 'record/motors/m1/poles', value: '4' }
    await tx.inputTick.create({ data: { ...tick, personId: 'a', personName: 'A', at: now() } })
    await tx.shareDownload.create({ data: { organisationId, id: 'download', linkId: 'link', at: now(), sha256: '' } })
  })
}

/** Tables whose rows belong to an organisation, as the database itself lists them. */
const tenantTables = (db: Database | Tx) => db.$queryRaw<{ name: string; forced: boolean; policies: number }[]>`
  select c.relname as name, c.relforcerowsecurity as forced,
    (select count(*)::int from pg_policies p where p.schemaname = 'public' and p.tablename = c.relname) as policies
  from pg_class c where c.relnamespace = 'public'::regnamespace and c.relkind = 'r' and c.relrowsecurity order by 1`

const countIn = async (tx: Tx, table: string, where = 'true'): Promise<number> => {
  const [row] = await tx.$queryRawUnsafe<{ count: number }[]>(`select count(*)::int from "${table}" where ${where}`)
  return row!.count
}

/** How many rows of each table are visible to whoever `come` lets in. */
const seenBy = (come: (tx: Tx) => Promise<unknown>, where?: (table: string) => string) =>
  database().$transaction(async (tx) => {
    await come(tx)
    const seen: Record<string, number> = {}
    for (const { name } of await tenantTables(tx)) seen[name] = await countIn(tx, name, where?.(name))
    return seen
  })

const ofTheDemo = (table: string) => `${table === 'organisation' ? 'id' : 'organisation_id'} = '${demo.organisationId}'`
const none = (seen: Record<string, number>) => Object.fromEntries(Object.keys(seen).map((table) => [table, 0]))

describe('the database keeps organisations apart by itself', () => {
  test('every table that names an organisation, and that of organisations, is guarded, its owner included', async () => {
    const tables = await tenantTables(database())
    const naming = await database().$queryRaw<{ name: string }[]>`
      select table_name as name from information_schema.columns
      where table_schema = 'public' and column_name = 'organisation_id'`
    expect(tables.map(({ name }) => name)).toEqual([...naming.map(({ name }) => name), 'organisation'].sort())
    for (const table of tables) expect(table).toMatchObject({ forced: true, policies: expect.any(Number) })
    expect(tables.filter(({ policies }) => policies === 0)).toEqual([])
  })

  test('the role of the application can neither switch the guard off for itself nor do everything', async () => {
    const roles = await database().$queryRaw`
      select rolsuper, rolbypassrls from pg_roles where rolname = current_user`
    expect(roles).toEqual([{ rolsuper: false, rolbypassrls: false }])
  })
})

describe('rows of an organisation', () => {
  test('are all there for its own people, in every table', async () => {
    const scope = { kind: 'project' as const, id: demo.projectId }
    const seen = await seenBy((tx) => enter(tx, actorAs('engineer'), scope), ofTheDemo)
    expect(Object.entries(seen).filter(([, count]) => count === 0)).toEqual([])
  })

  test('are seen by nobody who has entered another organisation', async () => {
    const scope = { kind: 'organisation' as const, id: elsewhere.id }
    const seen = await seenBy((tx) => enter(tx, stranger, scope), ofTheDemo)
    expect(seen).toEqual(none(seen))
    const own = await seenBy((tx) => enter(tx, stranger, scope))
    expect(own).toMatchObject({ organisation: 1, membership: 1, authority: 1, audit_event: 1, project: 0 })
  })

  test('are seen by nobody who has entered none, whoever held the connection before', async () => {
    for (let round = 0; round < 12; round += 1) {
      await read(plantRecords, actorAs('engineer'), { projectId: demo.projectId })
      const seen = await seenBy(async () => undefined)
      expect(seen).toEqual(none(seen))
    }
  })

  test('are neither changed nor added to from another organisation', async () => {
    const scope = { kind: 'organisation' as const, id: elsewhere.id }
    const changed = await database().$transaction(async (tx) => {
      await enter(tx, stranger, scope)
      return tx.project.updateMany({ where: { id: demo.projectId }, data: { name: 'taken over' } })
    })
    expect(changed.count).toBe(0)
    const added = database().$transaction(async (tx) => {
      await enter(tx, stranger, scope)
      const data = { organisationId: demo.organisationId, id: 'smuggled', name: 'smuggled', client: '' }
      await tx.project.create({ data: { ...data, createdAt: now(), auditHash: '' } })
    })
    await expect(added).rejects.toThrow(/row-level security/)
  })
})

test('a person of another organisation is told the same of what is there and of what is not', async () => {
  const { projectId, studyId, organisationId } = demo
  const refusal = { code: 'not-found', message: expect.stringMatching(/nothing here that you can open/) }
  for (const id of [projectId, 'never-was']) {
    await expect(read(plantRecords, stranger, { projectId: id })).rejects.toMatchObject(refusal)
  }
  await expect(read(studyView, stranger, { studyId })).rejects.toMatchObject(refusal)
  const change = { projectId, kind: 'bus' as const, id: 'pcc', version: 1, values: {} }
  await expect(perform(changeRecord, stranger, change)).rejects.toMatchObject(refusal)
  const entering = database().$transaction((tx) => enter(tx, stranger, { kind: 'organisation', id: organisationId }))
  await expect(entering).rejects.toMatchObject(refusal)
  expect(await read(myProjects, stranger, {})).toEqual([])
})
