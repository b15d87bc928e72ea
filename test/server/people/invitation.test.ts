import { expect, test } from 'vitest'
import type { Actor } from '@/lib/server/actor'
import { now } from '@/lib/server/clock'
import { database } from '@/lib/server/db'
import { enterAsJob } from '@/lib/server/enter'
import { linkDigest } from '@/lib/server/link-token'
import { createAccount } from '@/lib/server/people/create-account'
import { inviteMember, withdrawInvitation } from '@/lib/server/people/invite'
import { acceptInvitation, joinProject, readInvitation } from '@/lib/server/people/join'
import { changeMember } from '@/lib/server/people/member-commands'
import { projectMembers } from '@/lib/server/people/member-queries'
import { myProjects } from '@/lib/server/people/queries'
import { perform } from '@/lib/server/perform'
import { plantRecords } from '@/lib/server/plants/queries'
import { read } from '@/lib/server/read'
import { demo } from '@/prisma/seed/seed-demo'
import { actorAs } from '../support/cast-actor'
import { breakOf, chainOf } from '../support/chain'
import { useDemo } from '../support/demo'

useDemo()
const { projectId, organisationId } = demo
const administrator = actorAs('administrator')
const dead = { code: 'not-found', message: expect.stringMatching(/^This link leads nowhere/) }

const ahead = (days: number) => new Date(Date.now() + days * 86_400_000).toISOString().slice(0, 10)

let count = 0
const invitee = () => {
  count += 1
  return { projectId, name: `N. Example ${count}`, email: `n${count}@newcomers.example`, guest: false }
}

const asDemo = <T>(work: (tx: Parameters<typeof enterAsJob>[0]) => Promise<T>) =>
  database().$transaction(async (tx) => {
    await enterAsJob(tx, organisationId)
    return work(tx)
  })

const personOf = async (email: string): Promise<Actor> => {
  const { id: userId, name } = await database().user.findUniqueOrThrow({ where: { email } })
  return { userId, name, email }
}

test('somebody new opens the link, chooses a password and is a member with the roles of the invitation', async () => {
  const asked = invitee()
  const { token } = await perform(inviteMember, administrator, { ...asked, roles: ['checker'] })
  expect(await readInvitation(token)).toMatchObject({ email: asked.email, roles: ['checker'], guest: false })
  expect(await joinProject(token, 'a password of my own')).toEqual({ email: asked.email })
  const person = await personOf(asked.email)
  expect(await read(myProjects, person, {})).toMatchObject([{ projectId, roles: ['checker'] }])
  const { members } = await read(projectMembers, administrator, { projectId })
  expect(members.find(({ userId }) => userId === person.userId)).toMatchObject({ guest: false, endsAt: null })
  const { events } = await asDemo(chainOf)
  expect(events.slice(-2).map(({ action, actorId }) => [action, actorId])).toEqual([
    ['member-invited', administrator.userId],
    ['member-joined', person.userId],
  ])
  expect(await asDemo(breakOf)).toBeNull()
})

test('a link that was used, withdrawn, has run out or never was is told the same', async () => {
  const used = await perform(inviteMember, administrator, { ...invitee(), roles: ['engineer'] })
  await joinProject(used.token, 'a password of my own')
  const withdrawn = await perform(inviteMember, administrator, { ...invitee(), roles: ['engineer'] })
  await perform(withdrawInvitation, administrator, { projectId, invitationId: withdrawn.invitationId })
  const late = await perform(inviteMember, administrator, { ...invitee(), roles: ['engineer'] })
  await asDemo((tx) =>
    tx.invitation.updateMany({ where: { id: late.invitationId }, data: { expiresAt: new Date(Date.now() - 1) } }),
  )
  for (const token of [used.token, withdrawn.token, late.token, 'x'.repeat(43), linkDigest(used.token)]) {
    await expect(readInvitation(token)).rejects.toMatchObject(dead)
    await expect(joinProject(token, 'a password of my own')).rejects.toMatchObject(dead)
    await expect(perform(acceptInvitation, actorAs('client'), { token })).rejects.toMatchObject(dead)
  }
})

test('of many who use one link at once exactly one gets in', async () => {
  const asked = invitee()
  const { token } = await perform(inviteMember, administrator, { ...asked, roles: ['engineer'] })
  const tries = await Promise.allSettled(Array.from({ length: 5 }, () => joinProject(token, 'a password of my own')))
  expect(tries.filter(({ status }) => status === 'fulfilled')).toHaveLength(1)
  expect(await database().user.count({ where: { email: asked.email } })).toBe(1)
})

test('an account is neither taken over nor entered by an invitation to its address', async () => {
  const asked = invitee()
  const account = { name: asked.name, email: asked.email, password: 'the password before', initialPassword: false }
  await database().$transaction((tx) => createAccount(tx, account, now()))
  const { token } = await perform(inviteMember, administrator, { ...asked, roles: ['engineer'] })
  await expect(joinProject(token, 'a password of another')).rejects.toMatchObject({ code: 'conflict' })
  await expect(perform(acceptInvitation, actorAs('client'), { token })).rejects.toMatchObject({ code: 'forbidden' })
  const owner = await personOf(asked.email)
  expect(await perform(acceptInvitation, owner, { token })).toEqual({ projectId })
  expect(await read(myProjects, owner, {})).toMatchObject([{ projectId, roles: ['engineer'] }])
})

test('whoever invites learns nothing of whether the address has an account', async () => {
  const known = invitee()
  await database().$transaction((tx) =>
    createAccount(tx, { ...known, password: 'the password before', initialPassword: false }, now()),
  )
  const answers = [
    await perform(inviteMember, administrator, { ...known, roles: ['engineer'] }),
    await perform(inviteMember, administrator, { ...invitee(), roles: ['engineer'] }),
  ]
  expect(answers.map((answer) => Object.keys(answer))).toEqual([
    ['invitationId', 'token', 'expiresAt'],
    ['invitationId', 'token', 'expiresAt'],
  ])
})

test('a guest comments or is the client, never more, and the access ends on the day that was given', async () => {
  const guest = { ...invitee(), guest: true }
  await expect(
    perform(inviteMember, administrator, { ...guest, roles: ['checker'], lastDay: ahead(9) }),
  ).rejects.toMatchObject({ code: 'invalid', issues: [{ path: ['roles'] }] })
  await expect(perform(inviteMember, administrator, { ...guest, roles: ['commenter'] })).rejects.toMatchObject({
    code: 'invalid',
    issues: [{ path: ['lastDay'] }],
  })
  const { token } = await perform(inviteMember, administrator, { ...guest, roles: ['commenter'], lastDay: ahead(9) })
  await joinProject(token, 'a password of my own')
  const person = await personOf(guest.email)
  expect(await read(myProjects, person, {})).toMatchObject([{ projectId, roles: ['commenter'] }])
  expect(await asDemo((tx) => tx.membership.count({ where: { userId: person.userId } }))).toBe(0)
  await asDemo((tx) =>
    tx.projectMembership.updateMany({ where: { userId: person.userId }, data: { endsAt: new Date(Date.now() - 1) } }),
  )
  expect(await read(myProjects, person, {})).toEqual([])
  await expect(read(plantRecords, person, { projectId })).rejects.toMatchObject({ code: 'not-found' })
  await perform(changeMember, administrator, {
    projectId,
    userId: person.userId,
    roles: ['commenter'],
    lastDay: ahead(3),
  })
  expect(await read(myProjects, person, {})).toMatchObject([{ projectId, roles: ['commenter'] }])
})

test('only an administrator invites, and sees the open invitations', async () => {
  for (const role of ['engineer', 'checker', 'approver', 'commenter', 'client'] as const) {
    const asking = perform(inviteMember, actorAs(role), { ...invitee(), roles: ['engineer'] })
    await expect(asking, role).rejects.toMatchObject({ code: 'forbidden' })
  }
  await perform(inviteMember, administrator, { ...invitee(), roles: ['engineer'] })
  expect((await read(projectMembers, actorAs('engineer'), { projectId })).invitations).toEqual([])
  expect((await read(projectMembers, administrator, { projectId })).invitations.length).toBeGreaterThan(0)
})

test('one address has one open invitation to a project', async () => {
  const asked = { ...invitee(), roles: ['engineer' as const] }
  await perform(inviteMember, administrator, asked)
  const again = { ...asked, email: asked.email.toUpperCase() }
  await expect(perform(inviteMember, administrator, again)).rejects.toMatchObject({ code: 'conflict' })
})

test('the secret of a link stands nowhere in the database', async () => {
  const { token } = await perform(inviteMember, administrator, { ...invitee(), roles: ['engineer'] })
  const rows = await asDemo(async (tx) => [await tx.invitation.findMany(), await tx.auditEvent.findMany()])
  expect(JSON.stringify(rows)).not.toContain(token)
})
