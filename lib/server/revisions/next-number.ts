import 'server-only'
import { DomainError } from '@/lib/errors'
import type { Tx } from '../db'
import { revisionState } from './subject'

/**
 * Number of the revision that would be frozen now. A revision that came back is tried again under its number; one that is with the
 * checker, in review or being signed must end first.
 */
export async function nextNumber(tx: Tx, studyId: string): Promise<{ number: number; attempt: number }> {
  const newest = await tx.revision.findFirst({
    where: { studyId },
    orderBy: [{ number: 'desc' }, { attempt: 'desc' }],
    select: { number: true, attempt: true, state: true },
  })
  if (!newest) return { number: 1, attempt: 1 }
  const state = revisionState(newest.state)
  if (state === 'draft') return { number: newest.number, attempt: newest.attempt + 1 }
  if (state === 'in-check' || state === 'in-review' || state === 'review-closed') {
    throw new DomainError(
      'wrong-state',
      `Revision ${newest.number} is under way: issue it or take it back before freezing the next.`,
    )
  }
  return { number: newest.number + 1, attempt: 1 }
}
