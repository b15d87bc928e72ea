import 'server-only'
import { DomainError } from '@/lib/errors'
import type { Participant } from '@/lib/study/review-view'
import type { Tx } from '../db'

const reviewing = ['engineer', 'checker', 'approver', 'commenter'] as const

/** The people of a project who read comments, by name. */
export async function participantsOf(tx: Tx, projectId: string, at: Date): Promise<Participant[]> {
  const rows = await tx.projectMembership.findMany({
    where: { projectId, roles: { hasSome: [...reviewing] }, OR: [{ endsAt: null }, { endsAt: { gt: at } }] },
    select: { userId: true, user: { select: { name: true } } },
  })
  return rows.map(({ userId, user }) => ({ userId, name: user.name })).sort((a, b) => a.name.localeCompare(b.name))
}

/** The person whom a comment is handed to; refused where they have no part in the review. */
export const participant = (people: readonly Participant[], userId: string): Participant => {
  const found = people.find((one) => one.userId === userId)
  if (!found) throw new DomainError('invalid', 'Choose somebody who reviews in this project.')
  return found
}

/** People named behind an @ in a text. */
export const mentionedIn = (text: string, people: readonly Participant[]): Participant[] =>
  people.filter(({ name }) => text.includes(`@${name}`))
