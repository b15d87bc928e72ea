import 'server-only'
import type { RevisionSubject } from '@/lib/policy/subject'
import { type Database, database, type Tx } from '../db'
import { enterAsJob } from '../enter'
import { toRevisionSubject, withSubject } from '../revisions/subject'
import type { LiveEvent } from './live-event'

/** An event and, where it concerns a revision, what policy has to know of that revision. */
export interface FeedEvent {
  event: LiveEvent
  subject: RevisionSubject | null
}

/** More than this at once is a browser that was away for long: it is told to load its page anew. */
export const mostReplayed = 200

const textIn = (payload: unknown, name: string): string | null => {
  const value =
    typeof payload === 'object' && payload !== null ? Object.entries(payload).find(([key]) => key === name)?.[1] : null
  return typeof value === 'string' ? value : null
}

const subjectsOf = async (tx: Tx, ids: readonly string[]): Promise<Map<string, RevisionSubject>> => {
  if (ids.length === 0) return new Map()
  const rows = await tx.revision.findMany({ where: { id: { in: [...new Set(ids)] } }, ...withSubject })
  return new Map(rows.map((row) => [row.id, toRevisionSubject(row)]))
}

/** The events of a project after a place in its chain, oldest first. */
export async function eventsAfter(
  organisationId: string,
  projectId: string,
  after: number,
  db: Database = database(),
): Promise<FeedEvent[]> {
  return db.$transaction(async (tx) => {
    await enterAsJob(tx, organisationId)
    const rows = await tx.auditEvent.findMany({
      where: { organisationId, scope: projectId, sequence: { gt: after } },
      orderBy: { sequence: 'asc' },
      take: mostReplayed + 1,
    })
    const events = rows.map(
      ({ sequence, action, actorName, actorId, subjectKind, subjectId, payload }): LiveEvent => ({
        sequence,
        action,
        by: actorName,
        actorId,
        subject: { kind: subjectKind, id: subjectId },
        revisionId: subjectKind === 'revision' ? subjectId : textIn(payload, 'revisionId'),
      }),
    )
    const subjects = await subjectsOf(
      tx,
      events.flatMap(({ revisionId }) => revisionId ?? []),
    )
    return events.map((event) => ({ event, subject: subjects.get(event.revisionId ?? '') ?? null }))
  })
}
