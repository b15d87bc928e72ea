import 'server-only'
import * as z from 'zod'
import type { CaseSeries } from '@/lib/engine/case-result'
import { DomainError } from '@/lib/errors'
import { allowedActions, can } from '@/lib/policy/can'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { readFrozenStudy } from '@/lib/study/read/read-frozen-study'
import { idInput } from '../identity'
import { query } from '../read'
import { unpackSeries } from '../series'
import type { RevisionLine } from '../studies/view'
import { presentRevision } from './present'
import { ofRevision } from './schema'
import { loadRevision, revisionState, toRevisionSubject, withSubject } from './subject'
import type { RevisionView } from './view'

const readable = {
  input: ofRevision,
  scope: ({ revisionId }: { revisionId: string }) => ({ kind: 'revision' as const, id: revisionId }),
  load: ({ tx }: { tx: Parameters<typeof loadRevision>[0] }, { revisionId }: { revisionId: string }) =>
    loadRevision(tx, revisionId),
  may: (actor: Parameters<typeof can>[0], { subject }: Awaited<ReturnType<typeof loadRevision>>) =>
    can(actor, 'read-revision', subject),
}

/**
 * The revisions of a study that the person may read, newest first.
 * @public
 */
export const revisionsOf = query({
  input: z.object({ studyId: idInput }),
  scope: ({ studyId }) => ({ kind: 'study' as const, id: studyId }),
  load: async () => undefined,
  // each revision is asked about below
  may: () => ({ allowed: true }),
  run: async ({ tx, policy }, { studyId }): Promise<RevisionLine[]> => {
    const rows = await tx.revision.findMany({
      where: { studyId },
      orderBy: [{ number: 'desc' }, { attempt: 'desc' }],
      select: { ...withSubject.select, frozenAt: true, frozenByName: true, purpose: true },
    })
    return rows
      .filter((row) => can(policy, 'read-revision', toRevisionSubject(row)).allowed)
      .map((row) => ({
        revisionId: row.id,
        number: row.number,
        attempt: row.attempt,
        state: revisionState(row.state),
        frozenAt: row.frozenAt.toISOString(),
        frozenBy: row.frozenByName,
        purpose: row.purpose,
      }))
  },
})

/** A revision with its decisions, signatures, report and what the person may do. */
export const revisionView = query({
  ...readable,
  run: (context, { revisionId }, { subject }): Promise<RevisionView> =>
    presentRevision(context, revisionId, allowedActions(context.policy, subject)),
})

/** The frozen study document. */
export const revisionDocument = query({
  ...readable,
  run: async ({ tx }, { revisionId }): Promise<StudyDocument> => {
    const { document } = await tx.revision.findFirstOrThrow({ where: { id: revisionId }, select: { document: true } })
    return readFrozenStudy(document)
  },
})

/** The curves of one case as they were frozen. */
export const revisionSeries = query({
  ...readable,
  input: ofRevision.extend({ caseId: idInput }),
  run: async ({ tx }, { revisionId, caseId }): Promise<CaseSeries> => {
    const { runId } = await tx.revision.findFirstOrThrow({ where: { id: revisionId }, select: { runId: true } })
    const row = await tx.caseRun.findFirst({ where: { runId, caseId }, select: { series: true } })
    if (!row?.series) throw new DomainError('not-found', 'This revision has no curves of this case.')
    return unpackSeries(row.series)
  },
})
