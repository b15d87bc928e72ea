import { chainBreak } from '@/lib/server/chain-break'
import type { Database, Tx } from '@/lib/server/db'
import { enterAsJob, enterAsPerson } from '@/lib/server/enter'

/** A chain of events: that of an organisation, or of one of its projects. */
export interface Chain {
  organisationId: string
  /** The project, or the organisation again. */
  scope: string
  name: string
  events: number
  /** Hash of the last event. */
  head: string
  /** The first event that does not follow from those before it; null if the chain holds. */
  brokenAt: number | null
  /** Hash of each event, in order. */
  hashes: readonly string[]
}

/** Every organisation that somebody belongs to: the database shows each only from inside. */
async function organisationIds(db: Database): Promise<string[]> {
  const people = await db.user.findMany({ select: { id: true }, orderBy: { id: 'asc' } })
  const ids = new Set<string>()
  for (const { id } of people) {
    const rows = await db.$transaction(async (tx) => {
      await enterAsPerson(tx, id)
      return tx.membership.findMany({ where: { userId: id }, select: { organisationId: true } })
    })
    for (const { organisationId } of rows) ids.add(organisationId)
  }
  return [...ids].sort()
}

interface Head {
  scope: string
  name: string
  sequence: number
  auditHash: string
}

async function chainUnder(tx: Tx, organisationId: string, { scope, name, ...head }: Head): Promise<Chain> {
  const events = await tx.auditEvent.findMany({ where: { organisationId, scope }, orderBy: { sequence: 'asc' } })
  return {
    organisationId,
    scope,
    name,
    events: head.sequence,
    head: head.auditHash,
    brokenAt: chainBreak(events, head),
    hashes: events.map(({ hash }) => hash),
  }
}

/** Every chain of the installation, each read and followed from its first event, organisation by organisation. */
export async function* chains(db: Database): AsyncGenerator<Chain> {
  for (const organisationId of await organisationIds(db)) {
    const found = await db.$transaction(
      async (tx) => {
        await enterAsJob(tx, organisationId)
        const { name, sequence, auditHash } = await tx.organisation.findFirstOrThrow({ where: { id: organisationId } })
        const projects = await tx.project.findMany({ orderBy: { id: 'asc' } })
        const heads: Head[] = [
          { scope: organisationId, name, sequence, auditHash },
          ...projects.map(({ id, ...project }) => ({ scope: id, ...project })),
        ]
        const list: Chain[] = []
        for (const head of heads) list.push(await chainUnder(tx, organisationId, head))
        return list
      },
      { isolationLevel: 'RepeatableRead', timeout: 300_000 },
    )
    yield* found
  }
}
