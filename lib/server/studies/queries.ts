import 'server-only'
import * as z from 'zod'
import type { CaseSeries } from '@/lib/engine/case-result'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import type { StudyHead, StudySettings, StudyTexts } from '@/lib/study/document/study-document'
import type { StudySummary } from '@/lib/study/summary'
import { idInput } from '../identity'
import { query } from '../read'
import { revisionState } from '../revisions/subject'
import { unpackSeries } from '../series'
import { inputHashIfAny } from './input-hash-of'
import { loadLiveStudy } from './live-study'
import { lastDone, loadProgress, loadRunState, loadSummary } from './run-state'
import type { RunProgress, StudyView } from './view'

const studyScope = ({ studyId }: { studyId: string }) => ({ kind: 'study' as const, id: studyId })
const ofStudy = {
  input: z.object({ studyId: idInput }),
  scope: studyScope,
  load: async () => undefined,
  may: (actor: Parameters<typeof can>[0]) => can(actor, 'read-study'),
}

/** A study in work with its plant, its last results and what the person may do. */
export const studyView = query({
  ...ofStudy,
  run: async ({ tx, policy, place }, { studyId }): Promise<StudyView> => {
    const { study, plant, records, document, problems } = await loadLiveStudy(tx, studyId)
    const project = await tx.project.findFirstOrThrow({ where: { id: study.projectId } })
    const revisions = await tx.revision.findMany({
      where: { studyId },
      orderBy: [{ number: 'desc' }, { attempt: 'desc' }],
    })
    const newest = revisions[0]
    const input = document ? await inputHashIfAny(document) : null
    return {
      sequence: project.sequence,
      studyId,
      projectId: study.projectId,
      organisationId: place.organisationId,
      project: { name: project.name, client: project.client },
      // written only after validation by the same schemas
      head: study.head as unknown as StudyHead,
      settings: study.settings as unknown as StudySettings,
      texts: study.texts as unknown as StudyTexts,
      frequency: study.frequency as unknown as StudyView['frequency'],
      numberStyle: study.numberStyle === 'comma' ? 'comma' : 'point',
      version: study.version,
      rows: records,
      plant,
      document,
      problems: [...problems, ...(input?.refusal?.issues ?? [])],
      state: newest ? revisionState(newest.state) : null,
      revisions: revisions.map((row) => ({
        revisionId: row.id,
        number: row.number,
        attempt: row.attempt,
        state: revisionState(row.state),
        frozenAt: row.frozenAt.toISOString(),
        frozenBy: row.frozenByName,
        purpose: row.purpose,
      })),
      roles: place.roles,
      may: {
        edit: can(policy, 'edit-study').allowed,
        compute: can(policy, 'compute').allowed,
        freeze: can(policy, 'freeze').allowed,
      },
      run: await loadRunState(tx, studyId, input?.hash ?? null),
    }
  },
})

/** Where the computation of a study stands: small enough to be asked every second. */
export const runProgress = query({
  ...ofStudy,
  run: async ({ tx }, { studyId }): Promise<RunProgress> => {
    return loadProgress(tx, studyId)
  },
})

/**
 * The last results of a study, without curves.
 * @public
 */
export const studyResults = query({
  ...ofStudy,
  run: async ({ tx }, { studyId }): Promise<StudySummary> => {
    const run = await lastDone(tx, studyId)
    if (!run) throw new DomainError('not-found', 'This study has no results yet: compute its cases first.')
    return loadSummary(tx, run)
  },
})

/** The curves of one case of the last results. */
export const caseSeries = query({
  ...ofStudy,
  input: z.object({ studyId: idInput, caseId: idInput }),
  run: async ({ tx }, { studyId, caseId }): Promise<CaseSeries> => {
    const run = await lastDone(tx, studyId)
    const row = run ? await tx.caseRun.findFirst({ where: { runId: run.id, caseId }, select: { series: true } }) : null
    if (!row?.series) throw new DomainError('not-found', 'There are no curves of this case: compute the cases first.')
    return unpackSeries(row.series)
  },
})
