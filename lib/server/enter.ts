import 'server-only'
import { DomainError } from '@/lib/errors'
import type { Role } from '@/lib/policy/role'
import { roles as allRoles } from '@/lib/policy/role'
import type { Actor } from './actor'
import { now } from './clock'
import type { Tx } from './db'
import { linkDigest } from './link-token'
import type { Place, Scope } from './place'

// This file alone sets what row-level security looks at, and only for the running transaction.
const setFor = {
  org: (tx: Tx, id: string) => tx.$executeRaw`select set_config('app.org', ${id}, true)`,
  user: (tx: Tx, id: string) => tx.$executeRaw`select set_config('app.user', ${id}, true)`,
  digest: (tx: Tx, digest: string) => tx.$executeRaw`select set_config('app.digest', ${digest}, true)`,
}

const isRole = (role: string): role is Role => allRoles.some((one) => one === role)

/** What a person cannot reach and what does not exist are told apart by nobody. */
const unreachable = (): DomainError =>
  new DomainError('not-found', 'There is nothing here that you can open: check the address, or ask for access.')

/**
 * Lets a person into the organisation that the scope lies in.
 * @throws DomainError `not-found` when the person has no part in it, or there is no such thing
 */
export async function enter(tx: Tx, actor: Actor, scope: Exclude<Scope, { kind: 'self' }>): Promise<Place> {
  await setFor.user(tx, actor.userId)
  if (scope.kind === 'organisation') return enterOrganisation(tx, actor, scope.id ?? actor.organisationId)
  if ('token' in scope) return enterByLink(tx, scope.kind, scope.token)
  for (const organisationId of await reachable(tx, actor)) {
    await setFor.org(tx, organisationId)
    const projectId = await projectOf(tx, scope)
    if (projectId === null) continue
    const roles = await rolesIn(tx, actor, organisationId, projectId)
    if (roles.length > 0) return { organisationId, projectId, roles }
  }
  await setFor.org(tx, '')
  throw unreachable()
}

/** Goes through the organisations that a person has a part in, one after the other. */
export async function enterEach<T>(tx: Tx, actor: Actor, visit: (organisationId: string) => Promise<T>): Promise<T[]> {
  await setFor.user(tx, actor.userId)
  const answers: T[] = []
  for (const organisationId of await reachable(tx, actor)) {
    await setFor.org(tx, organisationId)
    answers.push(await visit(organisationId))
  }
  await setFor.org(tx, '')
  return answers
}

/** Lets a job of the queue into the organisation that it was given with. */
export async function enterAsJob(tx: Tx, organisationId: string): Promise<void> {
  await setFor.org(tx, organisationId)
}

/** Looks at what a person belongs to, for a command of the console: no organisation is entered. */
export async function enterAsPerson(tx: Tx, userId: string): Promise<void> {
  await setFor.user(tx, userId)
}

/** Lets whoever founds an organisation into it, before anybody has a part in it. */
export async function enterAsFounder(tx: Tx, organisationId: string): Promise<void> {
  await setFor.org(tx, organisationId)
}

/** Lets whoever holds a registered file or certificate, and so can name its hash, into the organisation behind it; null when unknown. */
export async function enterAsReader(
  tx: Tx,
  kind: 'report' | 'certificate',
  digest: string,
): Promise<{ organisationId: string; subjectId: string } | null> {
  await setFor.digest(tx, digest)
  const entry = await tx.registerEntry.findUnique({ where: { kind_digest: { kind, digest } } })
  if (!entry) return null
  await setFor.org(tx, entry.organisationId)
  return { organisationId: entry.organisationId, subjectId: entry.subjectId }
}

/** A wrong link, one that ran out and one that was ended are told apart by nobody. */
const deadLink = (): DomainError =>
  new DomainError(
    'not-found',
    'This link leads nowhere: it was used, has run out or was ended. Ask whoever sent it for another one.',
  )

/** Lets whoever holds a link that is in force into the project behind it; who reads a shared report is a client there. */
async function enterByLink(tx: Tx, kind: 'invitation' | 'share', token: string): Promise<Place> {
  const tokenHash = linkDigest(token)
  await setFor.digest(tx, tokenHash)
  const stillOpen = { tokenHash, expiresAt: { gt: now() } }
  if (kind === 'invitation') {
    const row = await tx.invitation.findFirst({ where: { ...stillOpen, acceptedAt: null, withdrawnAt: null } })
    if (!row) throw deadLink()
    await setFor.org(tx, row.organisationId)
    return { organisationId: row.organisationId, projectId: row.projectId, roles: [] }
  }
  const row = await tx.shareLink.findFirst({ where: { ...stillOpen, endedAt: null } })
  if (!row) throw deadLink()
  await setFor.org(tx, row.organisationId)
  const revision = await tx.revision.findFirstOrThrow({ where: { id: row.revisionId }, select: { projectId: true } })
  return { organisationId: row.organisationId, projectId: revision.projectId, roles: ['client'] }
}

/** Of the parts in projects those that have not ended. */
const inForce = () => ({ OR: [{ endsAt: null }, { endsAt: { gt: now() } }] })

/** The person's organisations: their own first, then those where they are a guest of a project. */
async function reachable(tx: Tx, actor: Actor): Promise<string[]> {
  const where = { userId: actor.userId }
  const own = await tx.membership.findMany({ where, orderBy: { addedAt: 'asc' }, select: { organisationId: true } })
  const guest = await tx.projectMembership.findMany({
    where: { ...where, ...inForce() },
    select: { organisationId: true },
    distinct: 'organisationId',
  })
  const ids = new Set([...own, ...guest].map((row) => row.organisationId))
  return actor.organisationId && ids.has(actor.organisationId) ? [...new Set([actor.organisationId, ...ids])] : [...ids]
}

async function enterOrganisation(tx: Tx, actor: Actor, wanted: string | undefined): Promise<Place> {
  const membership = await tx.membership.findFirst({
    where: { userId: actor.userId, ...(wanted ? { organisationId: wanted } : {}) },
    orderBy: { addedAt: 'asc' },
  })
  if (!membership) throw unreachable()
  const { organisationId } = membership
  await setFor.org(tx, organisationId)
  const projects = await tx.projectMembership.findMany({
    where: { organisationId, userId: actor.userId, ...inForce() },
  })
  const held = new Set(projects.flatMap((row) => row.roles).filter(isRole))
  held.delete('administrator')
  if (membership.role === 'administrator') held.add('administrator')
  return { organisationId, projectId: null, roles: [...held] }
}

async function projectOf(
  tx: Tx,
  scope: Extract<Scope, { id: string; kind: 'project' | 'study' | 'revision' }>,
): Promise<string | null> {
  if (scope.kind === 'project') {
    const project = await tx.project.findFirst({ where: { id: scope.id }, select: { id: true } })
    return project?.id ?? null
  }
  if (scope.kind === 'study') {
    const study = await tx.study.findFirst({ where: { id: scope.id }, select: { projectId: true } })
    return study?.projectId ?? null
  }
  const revision = await tx.revision.findFirst({ where: { id: scope.id }, select: { projectId: true } })
  return revision?.projectId ?? null
}

async function rolesIn(tx: Tx, actor: Actor, organisationId: string, projectId: string): Promise<Role[]> {
  const { userId } = actor
  const [inProject, inOrganisation] = [
    await tx.projectMembership.findFirst({ where: { organisationId, projectId, userId, ...inForce() } }),
    await tx.membership.findFirst({ where: { organisationId, userId } }),
  ]
  const held = new Set((inProject?.roles ?? []).filter(isRole))
  if (inOrganisation?.role === 'administrator') held.add('administrator')
  return [...held]
}
