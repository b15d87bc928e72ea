import 'server-only'
import type { Prisma } from '@/prisma/generated/client'
import type { Tx } from '../db'

/**
 * Which comments stand in a revision: those made in it, and those of earlier revisions that were still unsettled when it
 * was frozen.
 */
export async function commentsIn(tx: Tx, revisionId: string): Promise<Prisma.CommentWhereInput> {
  const { studyId, frozenAt } = await tx.revision.findFirstOrThrow({
    where: { id: revisionId },
    select: { studyId: true, frozenAt: true },
  })
  return {
    studyId,
    OR: [{ revisionId }, { at: { lte: frozenAt }, OR: [{ closedAt: null }, { closedAt: { gt: frozenAt } }] }],
  }
}
