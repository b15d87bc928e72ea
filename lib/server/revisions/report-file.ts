import 'server-only'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import type { Actor } from '../actor'
import type { Tx } from '../db'
import { query, read } from '../read'
import { currentReport } from './current-report'
import { ofRevision } from './schema'
import { loadRevision } from './subject'

export interface ReportFile {
  /** File name for saving. */
  name: string
  bytes: Uint8Array<ArrayBuffer>
  sha256: string
}

const fileOf = query({
  input: ofRevision,
  scope: ({ revisionId }) => ({ kind: 'revision' as const, id: revisionId }),
  load: ({ tx }, { revisionId }) => loadRevision(tx, revisionId),
  may: (actor, { subject }) => can(actor, 'download-report', subject),
  run: ({ tx }, _input, loaded): Promise<ReportFile> => loadReportFile(tx, loaded),
})

/** The bytes that count for a revision now, with a name that says where it stands. */
export async function loadReportFile(
  tx: Tx,
  { row, subject }: Awaited<ReturnType<typeof loadRevision>>,
): Promise<ReportFile> {
  const revisionId = row.id
  const { reportId, roundId, report } = await currentReport(tx, revisionId)
  const kept = roundId
    ? await tx.signatureRound.findFirst({ where: { id: roundId }, select: { file: true } })
    : reportId
      ? await tx.report.findFirst({ where: { id: reportId }, select: { file: true } })
      : null
  if (!kept?.file || !report) {
    throw new DomainError('not-found', 'The report is still being rendered: try again in a moment.')
  }
  const { documentNumber } = await tx.study.findFirstOrThrow({
    where: { id: row.studyId },
    select: { documentNumber: true },
  })
  const standing = subject.state === 'issued' ? '' : `-${subject.state}`
  return {
    name: `${documentNumber.replace(/[^A-Za-z0-9._-]+/g, '-')}-rev${row.number}${standing}.pdf`,
    bytes: kept.file,
    sha256: report.sha256,
  }
}

/** The report of a revision for saving: the draft while it is in work, then the file as signed so far, and what was issued unaltered. */
export const reportFile = (actor: Actor, revisionId: string): Promise<ReportFile> => read(fileOf, actor, { revisionId })
