import 'server-only'
import { createHash } from 'node:crypto'
import { canonicalJson } from '@/lib/study/canonical-json'
import type { Tx } from './db'
import { toJson } from './to-json'

/** Hash before the first event of a chain. */
export const chainStart = '0'.repeat(64)

/** What happened, said by whoever did it. */
export interface Event {
  /** Past tense, plain: `record-changed`. */
  action: string
  subject: { kind: string; id: string }
  payload: Record<string, unknown>
}

/** The row that other events are chained after. */
export interface Head {
  organisationId: string
  /** Null for the organisation's own chain. */
  projectId: string | null
  sequence: number
  auditHash: string
}

/** One event as it is hashed. */
export interface ChainedEvent {
  organisationId: string
  scope: string
  sequence: number
  action: string
  actorId: string | null
  actorName: string
  subjectKind: string
  subjectId: string
  payload: unknown
  at: Date
  previousHash: string
}

/** SHA-256 over the canonical JSON of the event, the previous hash among its members. */
export function eventHash(event: ChainedEvent): string {
  const {
    organisationId,
    scope,
    sequence,
    action,
    actorId,
    actorName,
    subjectKind,
    subjectId,
    payload,
    at,
    previousHash,
  } = event
  const members = {
    organisationId,
    scope,
    sequence,
    action,
    actorId,
    actorName,
    subjectKind,
    subjectId,
    payload,
    previousHash,
  }
  return createHash('sha256')
    .update(canonicalJson({ ...members, at: at.toISOString() }))
    .digest('hex')
}

/** Locks the head row of a project (or of the organisation): from here to the end of the transaction nobody else changes anything in it. */
export async function lockHead(tx: Tx, organisationId: string, projectId: string | null): Promise<Head> {
  // Does not block rows that merely point at this one, so that a worker may store results meanwhile.
  const rows = projectId
    ? await tx.$queryRaw<{ sequence: number; audit_hash: string }[]>`
        select sequence, audit_hash from project where organisation_id = ${organisationId} and id = ${projectId} for no key update`
    : await tx.$queryRaw<{ sequence: number; audit_hash: string }[]>`
        select sequence, audit_hash from organisation where id = ${organisationId} for no key update`
  const row = rows[0]
  if (!row) throw new Error(`no head row of ${projectId ?? organisationId}`)
  return { organisationId, projectId, sequence: row.sequence, auditHash: row.audit_hash }
}

/** Adds events to the chain under its lock, and tells every process that listens once the transaction is through. */
export async function appendEvents(
  tx: Tx,
  head: Head,
  actor: { userId: string | null; name: string },
  at: Date,
  events: readonly Event[],
): Promise<Head> {
  if (events.length === 0) return head
  const { organisationId, projectId } = head
  const scope = projectId ?? organisationId
  let { sequence, auditHash } = head
  const rows = events.map((event) => {
    sequence += 1
    // hashed as the database gives it back
    const payload = toJson(event.payload)
    const chained: ChainedEvent = {
      organisationId,
      scope,
      sequence,
      action: event.action,
      actorId: actor.userId,
      actorName: actor.name,
      subjectKind: event.subject.kind,
      subjectId: event.subject.id,
      payload,
      at,
      previousHash: auditHash,
    }
    auditHash = eventHash(chained)
    return { ...chained, payload, hash: auditHash }
  })
  await tx.auditEvent.createMany({ data: rows })
  const data = { sequence, auditHash }
  if (projectId) await tx.project.update({ where: { organisationId_id: { organisationId, id: projectId } }, data })
  else await tx.organisation.update({ where: { id: organisationId }, data })
  await tx.$executeRaw`select pg_notify('breakaway_event', ${JSON.stringify({ organisationId, scope, sequence })})`
  return { ...head, sequence, auditHash }
}
