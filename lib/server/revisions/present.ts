import 'server-only'
import type { RevisionAction } from '@/lib/policy/action'
import { can } from '@/lib/policy/can'
import type { RevisionMove } from '@/lib/study/states'
import type { ReadContext } from '../context'
import { loadLiveStudy } from '../studies/live-study'
import { loadSummary } from '../studies/run-state'
import { currentReport } from './current-report'
import { expectedSigners } from './expected-signers'
import { movedBetween, type Versions, versionsOf } from './moved'
import { revisionState, signOffRole } from './subject'
import type { RevisionView } from './view'

/** A revision for its page. What moved since is said to those only who may read the live study. */
export async function presentRevision(
  { tx, place, policy }: ReadContext,
  revisionId: string,
  allowed: readonly RevisionAction[],
): Promise<RevisionView> {
  const row = await tx.revision.findFirstOrThrow({
    where: { id: revisionId },
    include: {
      study: { select: { title: true, documentNumber: true, project: { select: { sequence: true } } } },
      run: { select: { id: true, result: true } },
      decisions: { orderBy: { at: 'asc' } },
      rounds: { where: { endedAt: null }, include: { signoffs: { orderBy: { at: 'asc' } } } },
    },
  })
  const round = row.rounds[0]
  const issued = await tx.revision.findFirst({
    where: { studyId: row.studyId, state: 'issued', id: { not: row.id } },
    select: { id: true, number: true },
  })
  const { report, renderState, renderFailure } = await currentReport(tx, row.id)
  return {
    sequence: row.study.project.sequence,
    revisionId: row.id,
    studyId: row.studyId,
    projectId: row.projectId,
    organisationId: row.organisationId,
    title: row.study.title,
    documentNumber: row.study.documentNumber,
    number: row.number,
    attempt: row.attempt,
    state: revisionState(row.state),
    purpose: row.purpose,
    note: row.note,
    frozenAt: row.frozenAt.toISOString(),
    preparedBy: row.frozenByName,
    documentHash: row.documentHash,
    inputHash: row.inputHash,
    engineVersion: row.engineVersion,
    decisions: row.decisions.map(({ move, personName, note, at }) => ({
      move: move as RevisionMove | 'freeze',
      person: personName,
      note,
      at: at.toISOString(),
    })),
    signoffs: (round?.signoffs ?? []).map(({ role, personName, at, fingerprint }) => ({
      role: signOffRole(role),
      person: personName,
      at: at.toISOString(),
      certificate: fingerprint,
    })),
    expectedSigners: await expectedSigners(tx, row),
    report,
    renderState,
    renderFailure,
    roundStartedAt: round?.startedAt.toISOString() ?? null,
    preIssueChecks: row.checks,
    allowed,
    roles: place.roles,
    summary: await loadSummary(tx, row.run),
    movedSince: can(policy, 'read-study').allowed
      ? movedBetween(row.versions as unknown as Versions, versionsOf(await loadLiveStudy(tx, row.studyId)))
      : [],
    issuedAt: row.issuedAt?.toISOString() ?? null,
    supersededAt: row.supersededAt?.toISOString() ?? null,
    withdrawn: row.withdrawnAt ? { at: row.withdrawnAt.toISOString(), reason: row.withdrawnReason ?? '' } : null,
    issuedRevision: issued ? { revisionId: issued.id, number: issued.number } : null,
  }
}
