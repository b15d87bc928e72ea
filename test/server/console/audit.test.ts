import { expect, test } from 'vitest'
import { type Chain, chains } from '@/lib/server/console/audit/chains'
import { contradictions, headLine, readHeads } from '@/lib/server/console/audit/heads'
import { type Database, database } from '@/lib/server/db'
import { enterAsJob } from '@/lib/server/enter'
import { createProject } from '@/lib/server/people/commands'
import { perform } from '@/lib/server/perform'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from '../support/cast-actor'
import { useDemo } from '../support/demo'

useDemo()

const all = async (db: Database = database()): Promise<Chain[]> => {
  const found: Chain[] = []
  for await (const chain of chains(db)) found.push(chain)
  return found
}

test('every organisation and every project has a chain, and all of them hold', async () => {
  await perform(createProject, actorAs('engineer'), { organisationId: demo.organisationId, name: 'Second project' })
  const found = await all()
  expect(found.map(({ name }) => name)).toContain('Second project')
  expect(found.map(({ scope }) => scope)).toEqual(expect.arrayContaining([demo.organisationId, demo.projectId]))
  expect(found.filter(({ brokenAt }) => brokenAt !== null)).toEqual([])
})

test('heads that were kept elsewhere still stand after more has happened', async () => {
  const kept = readHeads((await all()).map(headLine).join('\n'))
  await perform(createProject, actorAs('engineer'), { organisationId: demo.organisationId, name: 'Third project' })
  expect(contradictions(kept, await all())).toEqual([])
})

test('a chain that was written anew from the beginning holds by itself and contradicts what was kept', async () => {
  const found = await all()
  const kept = readHeads(found.map(headLine).join('\n'))
  const rewritten = found.map((chain) =>
    chain.scope === demo.projectId ? { ...chain, hashes: chain.hashes.map((hash) => `0${hash.slice(1)}`) } : chain,
  )
  expect(contradictions(kept, rewritten)).toEqual([expect.stringMatching(/is not the one that was kept$/)])
  const without = found.filter(({ scope }) => scope !== demo.projectId)
  expect(contradictions(kept, without)).toEqual([expect.stringMatching(/this chain is gone/)])
})

test('an event that was changed behind the application’s back is named', async () => {
  const undone = new Error('undone')
  let broken: (number | null)[] = []
  const attempt = database().$transaction(async (tx) => {
    await enterAsJob(tx, demo.organisationId)
    await tx.$executeRaw`alter table audit_event disable trigger append_only`
    const scope = demo.projectId
    const first = await tx.auditEvent.findFirst({ where: { scope }, orderBy: { sequence: 'asc' } })
    if (!first) throw new Error('the demo project has no event')
    const key = { organisationId: demo.organisationId, scope, sequence: first.sequence }
    await tx.auditEvent.update({ where: { organisationId_scope_sequence: key }, data: { actorName: 'Somebody else' } })
    const within = { user: tx.user, $transaction: (work: (inner: typeof tx) => unknown) => work(tx) }
    broken = (await all(within as unknown as Database)).flatMap((one) => (one.scope === scope ? [one.brokenAt] : []))
    throw undone
  })
  await expect(attempt).rejects.toBe(undone)
  expect(broken).toEqual([1])
})

test('a kept list that is none is refused with its line', () => {
  expect(() => readHeads('{"organisationId":"a","scope":"b","events":1,"head":"c"}\nno')).toThrow(/^Line 2/)
})
