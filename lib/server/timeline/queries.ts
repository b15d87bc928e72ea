import 'server-only'
import * as z from 'zod'
import { can } from '@/lib/policy/can'
import { idInput } from '../identity'
import { query } from '../read'

/** One event of a project's chain as the timeline lists it. */
export interface TimelineLine {
  sequence: number
  at: string
  by: string
  action: string
  subject: { kind: string; id: string }
  payload: unknown
  hash: string
}

export interface Timeline {
  project: string
  lines: TimelineLine[]
  /** Sequence below which older events stand; null when there are none. */
  olderThan: number | null
  /** What the filters can be set to. */
  actions: string[]
  people: string[]
  head: { sequence: number; hash: string }
}

const onePage = 100
const mostExported = 50_000

const input = z.object({
  projectId: idInput,
  /** Events before this place only. */
  before: z.coerce.number().int().positive().optional(),
  action: z.string().max(60).optional(),
  by: z.string().max(120).optional(),
  /** Everything at once, for a file. */
  all: z.boolean().default(false),
})

/** What happened in a project, newest first, by whom; the chain's own figures stand beside it. */
export const projectTimeline = query({
  input,
  scope: ({ projectId }) => ({ kind: 'project' as const, id: projectId }),
  load: async () => undefined,
  may: (actor) => can(actor, 'read-study'),
  run: async ({ tx, place: { organisationId } }, { projectId, before, action, by, all }): Promise<Timeline> => {
    const project = await tx.project.findFirstOrThrow({
      where: { id: projectId },
      select: { name: true, sequence: true, auditHash: true },
    })
    const ofProject = { organisationId, scope: projectId }
    const take = all ? mostExported : onePage
    const rows = await tx.auditEvent.findMany({
      where: {
        ...ofProject,
        ...(before ? { sequence: { lt: before } } : {}),
        ...(action ? { action } : {}),
        ...(by ? { actorName: by } : {}),
      },
      orderBy: { sequence: 'desc' },
      take: take + 1,
    })
    const shown = rows.slice(0, take)
    const actions = await tx.auditEvent.findMany({
      where: ofProject,
      distinct: 'action',
      select: { action: true },
      orderBy: { action: 'asc' },
    })
    const people = await tx.auditEvent.findMany({
      where: ofProject,
      distinct: 'actorName',
      select: { actorName: true },
      orderBy: { actorName: 'asc' },
    })
    return {
      project: project.name,
      lines: shown.map((row) => ({
        sequence: row.sequence,
        at: row.at.toISOString(),
        by: row.actorName,
        action: row.action,
        subject: { kind: row.subjectKind, id: row.subjectId },
        payload: row.payload,
        hash: row.hash,
      })),
      olderThan: rows.length > take ? (shown.at(-1)?.sequence ?? null) : null,
      actions: actions.map((row) => row.action),
      people: people.map((row) => row.actorName),
      head: { sequence: project.sequence, hash: project.auditHash },
    }
  },
})
