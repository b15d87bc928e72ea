import 'server-only'
import type { ReportInput } from '@/lib/report/report-input'
import type { Database } from '../db'
import { enterAsJob } from '../enter'
import { reportInputOf } from '../reports/report-input'
import type { JobIds } from './enqueue'

/** A report that this worker holds, with what it is rendered from. */
export interface ClaimedReport {
  organisationId: string
  projectId: string
  revisionId: string
  reportId: string
  kind: 'draft' | 'final'
  attempt: number
  input: ReportInput
}

/** Takes a report that is still to be rendered; null when it is done, or given up. */
export function claimReport(
  db: Database,
  { organisationId, reportId }: JobIds['render'],
): Promise<ClaimedReport | null> {
  return db.$transaction(async (tx) => {
    await enterAsJob(tx, organisationId)
    const taken = await tx.report.updateMany({
      where: { id: reportId, state: { in: ['queued', 'running'] } },
      data: { state: 'running', attempt: { increment: 1 } },
    })
    if (taken.count === 0) return null
    const { revisionId, kind, attempt, revision } = await tx.report.findFirstOrThrow({
      where: { id: reportId },
      include: { revision: { select: { projectId: true } } },
    })
    return {
      organisationId,
      projectId: revision.projectId,
      revisionId,
      reportId,
      kind: kind === 'final' ? 'final' : 'draft',
      attempt,
      input: await reportInputOf(tx, revisionId, kind !== 'final'),
    }
  })
}
