import 'server-only'
import * as z from 'zod'
import type { Role } from '@/lib/policy/role'
import type { RevisionState } from '@/lib/study/states'
import { idInput } from '../identity'
import { ownQuery } from '../read'
import { projectsIn } from './projects-in'

/** A project in the list of a person's work. */
export interface ProjectLine {
  projectId: string
  name: string
  client: string
  organisationId: string
  organisation: string
  roles: Role[]
  studies: StudyLine[]
}

export interface StudyLine {
  studyId: string
  title: string
  documentNumber: string
  /** State of the newest revision; null before the first freeze. */
  state: RevisionState | null
  /** The newest revision that the person may read, and its number. */
  revision: { revisionId: string; number: number; state: RevisionState } | null
}

/** Every project that the person has a part in, with its studies. */
export const myProjects = ownQuery({
  input: z.object({}),
  own: async ({ tx, actor, at, each }): Promise<ProjectLine[]> =>
    (await each((organisationId) => projectsIn(tx, actor, organisationId, at))).flat(),
})

export interface OrganisationLine {
  organisationId: string
  name: string
  role: 'administrator' | 'member'
}

/** The organisations that the person belongs to (not those where they are a guest). */
export const myOrganisations = ownQuery({
  input: z.object({}),
  own: async ({ tx, actor, each }): Promise<OrganisationLine[]> => {
    const lines = await each(async (organisationId) => {
      const membership = await tx.membership.findFirst({
        where: { organisationId, userId: actor.userId },
        include: { organisation: { select: { name: true } } },
      })
      if (!membership) return null
      const role = membership.role === 'administrator' ? ('administrator' as const) : ('member' as const)
      return { organisationId, name: membership.organisation.name, role }
    })
    return lines.filter((line) => line !== null)
  },
})

export interface OwnCertificate {
  organisationId: string
  organisation: string
  fingerprint: string
  listedAt: string
  notAfter: string
  subject: { name: string; email: string }
}

/** The person's signing certificate that is in force; null when there is none yet. */
export const myCertificate = ownQuery({
  input: z.object({ organisationId: idInput.optional() }),
  own: async ({ tx, actor, at, each }, input): Promise<OwnCertificate | null> => {
    const found = await each(async (organisationId) => {
      if (input.organisationId && input.organisationId !== organisationId) return null
      const row = await tx.certificate.findFirst({
        where: { organisationId, userId: actor.userId, revokedAt: null, notAfter: { gt: at } },
        include: { membership: { include: { organisation: { select: { name: true } } } } },
      })
      if (!row) return null
      return {
        organisationId,
        organisation: row.membership.organisation.name,
        fingerprint: row.fingerprint,
        listedAt: row.listedAt.toISOString(),
        notAfter: row.notAfter.toISOString(),
        subject: { name: row.subjectName, email: row.subjectEmail },
      }
    })
    return found.find((certificate) => certificate !== null) ?? null
  },
})
