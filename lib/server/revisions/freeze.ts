import 'server-only'
import { createHash } from 'node:crypto'
import { DomainError } from '@/lib/errors'
import { canonicalBytes } from '@/lib/study/canonical-json'
import { preIssueChecks } from '@/lib/study/pre-issue-checks'
import type { WriteContext } from '../context'
import { newId } from '../identity'
import type { Done } from '../perform'
import { requestReport } from '../reports/request-report'
import { inputHashOf } from '../studies/input-hash-of'
import { loadLiveStudy } from '../studies/live-study'
import { lastDone } from '../studies/run-state'
import type { StudyRow } from '../studies/study-of'
import { toJson } from '../to-json'
import { addDecision } from './decisions'
import { versionsOf } from './moved'
import { nextNumber } from './next-number'

/** Copies plant, study and results as they are into a revision, which is then never changed, and asks for its draft report. */
export async function freeze(
  context: WriteContext,
  study: StudyRow,
  note: string,
): Promise<Done<{ revisionId: string; number: number; attempt: number }>> {
  const { tx, place, actor, at } = context
  const { organisationId } = place
  const { id: studyId, projectId } = study
  const { number, attempt } = await nextNumber(tx, studyId)
  const live = await loadLiveStudy(tx, studyId)
  if (!live.document)
    throw new DomainError('invalid', 'The study is not complete: correct what is marked.', live.problems)
  const inputHash = await inputHashOf(live.document)
  const run = await lastDone(tx, studyId)
  if (!run || run.inputHash !== inputHash) {
    throw new DomainError(
      'wrong-state',
      'Compute the cases first: there are no results of the records as they are now.',
    )
  }
  const document = canonicalBytes(live.document)
  const documentHash = createHash('sha256').update(document).digest('hex')
  const revisionId = newId()
  await tx.revision.create({
    data: {
      organisationId,
      projectId,
      studyId,
      id: revisionId,
      number,
      attempt,
      document,
      documentHash,
      inputHash,
      engineVersion: run.engineVersion,
      runId: run.id,
      versions: toJson(versionsOf(live)),
      note,
      frozenById: actor.userId,
      frozenByName: actor.name,
      frozenAt: at,
      state: 'draft',
      checks: toJson({ checks: preIssueChecks(live.document) }),
    },
  })
  await addDecision(tx, { organisationId, revisionId, move: 'freeze', actor, note, at })
  await requestReport(context, revisionId, 'draft')
  return {
    answer: { revisionId, number, attempt },
    events: [
      {
        action: 'revision-frozen',
        subject: { kind: 'revision', id: revisionId },
        payload: { studyId, number, attempt, documentHash, inputHash, note },
      },
    ],
  }
}
