import 'server-only'
import { can } from '@/lib/policy/can'
import type { Role } from '@/lib/policy/role'
import type { Actor } from '../actor'
import type { Tx } from '../db'
import { toRevisionSubject, withSubject } from '../revisions/subject'
import type { ProjectLine, StudyLine } from './queries'

/** The projects of one organisation, already entered, that a person has a part in. */
export async function projectsIn(tx: Tx, actor: Actor, organisationId: string, at: Date): Promise<ProjectLine[]> {
  const { userId } = actor
  const own = await tx.membership.findFirst({ where: { organisationId, userId } })
  const administers = own?.role === 'administrator'
  const ownPart = { userId, OR: [{ endsAt: null }, { endsAt: { gt: at } }] }
  const projects = await tx.project.findMany({
    where: administers ? {} : { members: { some: ownPart } },
    include: { organisation: { select: { name: true } }, members: { where: ownPart } },
    orderBy: { createdAt: 'asc' },
  })
  const lines: ProjectLine[] = []
  for (const project of projects) {
    const roles = [
      ...new Set([...(project.members[0]?.roles ?? []), ...(administers ? ['administrator'] : [])]),
    ] as Role[]
    lines.push({
      projectId: project.id,
      name: project.name,
      client: project.client,
      organisationId,
      organisation: project.organisation.name,
      roles,
      studies: await studiesIn(tx, { userId, roles }, project.id),
    })
  }
  return lines
}

async function studiesIn(
  tx: Tx,
  actor: { userId: string; roles: readonly Role[] },
  projectId: string,
): Promise<StudyLine[]> {
  const studies = await tx.study.findMany({
    where: { projectId },
    select: {
      id: true,
      title: true,
      documentNumber: true,
      revisions: { orderBy: [{ number: 'desc' }, { attempt: 'desc' }], ...withSubject },
    },
    orderBy: { createdAt: 'asc' },
  })
  const readsStudy = can(actor, 'read-study').allowed
  return studies.flatMap(({ id, title, documentNumber, revisions }) => {
    const readable = revisions.find((row) => can(actor, 'read-revision', toRevisionSubject(row)).allowed)
    // who may read neither the live study nor any revision does not learn that it exists
    if (!readsStudy && !readable) return []
    const shown = readable ? toRevisionSubject(readable).state : null
    return [
      {
        studyId: id,
        title,
        documentNumber,
        state: readsStudy && revisions[0] ? toRevisionSubject(revisions[0]).state : shown,
        revision: readable && shown ? { revisionId: readable.id, number: readable.number, state: shown } : null,
      },
    ]
  })
}
