import 'server-only'
import type { HoldUp } from '@/lib/study/review-view'
import type { Tx } from '../db'
import { keptChecks } from '../revisions/kept-checks'
import { commentsIn } from './visible'

/** What holds up the closing of a revision's review: failed checks, errors that are not closed, comments without an answer. */
export async function holdUpsOf(tx: Tx, revisionId: string): Promise<HoldUp[]> {
  const { checks } = await tx.revision.findFirstOrThrow({ where: { id: revisionId }, select: { checks: true } })
  const comments = await tx.comment.findMany({
    where: {
      AND: [await commentsIn(tx, revisionId), { OR: [{ kind: 'error', state: { not: 'closed' } }, { state: 'open' }] }],
    },
    orderBy: { number: 'asc' },
    select: { id: true, number: true, kind: true, state: true, anchorLabel: true },
  })
  const waivers = await tx.waiver.findMany({ where: { revisionId } })
  const waivedOf = (kind: HoldUp['kind'], subjectId: string): HoldUp['waived'] => {
    const found = waivers.find((one) => one.kind === kind && one.subjectId === subjectId)
    return found ? { reason: found.reason, person: found.personName, at: found.at.toISOString() } : null
  }
  return [
    ...keptChecks(checks)
      .filter(({ passed }) => !passed)
      .map(({ id, sentence, issues }): HoldUp => {
        const count = issues.length > 1 ? ` (${issues.length} places)` : ''
        const what = issues.length === 1 ? issues[0]!.message : `${sentence}${count}`
        return { kind: 'check', subjectId: id, what, waived: waivedOf('check', id) }
      }),
    ...comments.map(({ id, number, kind, state, anchorLabel }): HoldUp => {
      const why = kind === 'error' ? 'error not closed' : 'without an answer'
      const what = `Comment ${number}, ${state === 'open' && kind === 'error' ? 'error without an answer' : why}: ${anchorLabel}`
      return { kind: 'comment', subjectId: id, what, waived: waivedOf('comment', id) }
    }),
  ]
}

/** Hold-ups that nobody has waived. */
export const unsettled = (holdUps: readonly HoldUp[]): readonly HoldUp[] => holdUps.filter(({ waived }) => !waived)
