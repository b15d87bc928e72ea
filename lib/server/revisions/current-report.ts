import 'server-only'
import type { Tx } from '../db'
import type { RenderState, ReportFileFacts } from './view'

export interface CurrentReport {
  /** The report row whose file is shown; null before one is ready. */
  reportId: string | null
  /** The round whose signed file stands for it. */
  roundId: string | null
  report: ReportFileFacts | null
  renderState: RenderState
  renderFailure: string | null
}

const states = ['queued', 'running', 'done', 'failed'] as const

/**
 * Which PDF of a revision counts now: the file with the signatures given so far, else the final one, else the newest draft.
 * The state of rendering is that of the newest request.
 */
export async function currentReport(tx: Tx, revisionId: string): Promise<CurrentReport> {
  const revision = await tx.revision.findFirstOrThrow({ where: { id: revisionId }, select: { state: true } })
  // after a revision was taken back, the final report of the abandoned round is not shown any more
  const kind = ['draft', 'in-check', 'in-review'].includes(revision.state) ? 'draft' : 'final'
  const reports = await tx.report.findMany({ where: { revisionId, kind }, orderBy: { queuedAt: 'desc' } })
  const newest = reports[0]
  const ready = reports.find((report) => report.state === 'done')
  const round = kind === 'final' ? await tx.signatureRound.findFirst({ where: { revisionId, endedAt: null } }) : null
  const size = round
    ? await tx.$queryRaw<{ bytes: number }[]>`
        select length(file) as bytes from signature_round where organisation_id = ${round.organisationId} and id = ${round.id}`
    : []
  const report = ready
    ? {
        sha256: round?.sha256 ?? ready.sha256 ?? '',
        pages: ready.pages ?? 0,
        bytes: size[0]?.bytes ?? ready.bytes ?? 0,
      }
    : null
  return {
    reportId: ready?.id ?? null,
    roundId: round?.id ?? null,
    report,
    renderState: states.find((state) => state === newest?.state) ?? 'none',
    renderFailure: newest?.failure ?? null,
  }
}
