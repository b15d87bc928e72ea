import 'server-only'
import { DomainError } from '@/lib/errors'
import type { RevisionSubject } from '@/lib/policy/subject'
import { type RevisionState, revisionStates, type SignOffRole, signOffRoles } from '@/lib/study/states'
import type { Prisma } from '@/prisma/generated/client'
import type { Tx } from '../db'

/** What of a revision policy needs, as a selection; files and frozen bytes stay where they are. */
export const withSubject = {
  select: {
    id: true,
    organisationId: true,
    projectId: true,
    studyId: true,
    number: true,
    attempt: true,
    state: true,
    frozenById: true,
    checkedById: true,
    reviewAcceptedById: true,
    rounds: {
      where: { endedAt: null },
      select: { id: true, signoffs: { select: { role: true, userId: true } } },
    },
  },
} as const satisfies Prisma.RevisionDefaultArgs

export type RevisionWithSubject = Prisma.RevisionGetPayload<typeof withSubject>

/** The state as its type; any other word in the column is a bug. */
export function revisionState(word: string): RevisionState {
  const state = revisionStates.find((one) => one === word)
  if (!state) throw new Error(`a revision in the state ${word}`)
  return state
}

export function signOffRole(word: string): SignOffRole {
  const role = signOffRoles.find((one) => one === word)
  if (!role) throw new Error(`a sign-off as ${word}`)
  return role
}

export function toRevisionSubject(row: RevisionWithSubject): RevisionSubject {
  const signoffs = row.rounds[0]?.signoffs ?? []
  return {
    state: revisionState(row.state),
    preparedBy: row.frozenById,
    checkedBy: row.checkedById,
    reviewAccepted: row.reviewAcceptedById !== null,
    signed: signoffs.map((signoff) => signOffRole(signoff.role)),
    approvedBy: signoffs.find((signoff) => signoff.role === 'approved')?.userId ?? null,
  }
}

/** The revision as policy sees it. The scope has found it already, so that its absence is a bug or a race. */
export async function loadRevision(
  tx: Tx,
  revisionId: string,
): Promise<{ row: RevisionWithSubject; subject: RevisionSubject }> {
  const row = await tx.revision.findFirst({ where: { id: revisionId }, ...withSubject })
  if (!row) throw new DomainError('not-found', 'There is no such revision.')
  return { row, subject: toRevisionSubject(row) }
}
