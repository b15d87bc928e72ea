import 'server-only'
import * as z from 'zod'
import { can } from '@/lib/policy/can'
import type { RevisionState, SignOffRole } from '@/lib/study/states'
import { linkHolder } from '../actor'
import type { Tx } from '../db'
import { linkDigest, linkToken } from '../link-token'
import { query, read } from '../read'
import { currentReport } from '../revisions/current-report'
import { loadRevision, signOffRole } from '../revisions/subject'
import type { ReportFileFacts } from '../revisions/view'

/** What whoever holds a link is shown before anything is downloaded. */
export interface SharedReport {
  organisation: string
  title: string
  documentNumber: string
  number: number
  state: RevisionState
  purpose: string | null
  issuedAt: string | null
  supersededAt: string | null
  withdrawn: { at: string; reason: string } | null
  /** Number of the revision that is in force instead of this one. */
  inForce: number | null
  signers: { role: SignOffRole; person: string; at: string }[]
  report: ReportFileFacts | null
  recipient: string
  expiresAt: string
  /** Null for no bound. */
  downloadsLeft: number | null
  asksPassphrase: boolean
}

const input = z.object({ token: linkToken })

export const shareScope = ({ token }: { token: string }) => ({ kind: 'share' as const, token })

/** The link, as it stands now, and the revision behind it. */
export async function loadShare(tx: Tx, token: string) {
  const link = await tx.shareLink.findFirstOrThrow({ where: { tokenHash: linkDigest(token) } })
  return { link, revision: await loadRevision(tx, link.revisionId) }
}

const sharedReport = query({
  input,
  scope: shareScope,
  load: ({ tx }, { token }) => loadShare(tx, token),
  may: (actor, { revision }) => can(actor, 'read-revision', revision.subject),
  run: async ({ tx }, _input, { link, revision: { row, subject } }): Promise<SharedReport> => {
    const found = await tx.revision.findFirstOrThrow({
      where: { id: row.id },
      select: {
        purpose: true,
        issuedAt: true,
        supersededAt: true,
        withdrawnAt: true,
        withdrawnReason: true,
        study: { select: { title: true, documentNumber: true } },
        rounds: { where: { endedAt: null }, select: { signoffs: { orderBy: { at: 'asc' } } } },
      },
    })
    const { name } = await tx.organisation.findFirstOrThrow({ where: { id: row.organisationId } })
    const instead = await tx.revision.findFirst({
      where: { studyId: row.studyId, state: 'issued', id: { not: row.id } },
      select: { number: true },
    })
    return {
      organisation: name,
      title: found.study.title,
      documentNumber: found.study.documentNumber,
      number: row.number,
      state: subject.state,
      purpose: found.purpose,
      issuedAt: found.issuedAt?.toISOString() ?? null,
      supersededAt: found.supersededAt?.toISOString() ?? null,
      withdrawn: found.withdrawnAt
        ? { at: found.withdrawnAt.toISOString(), reason: found.withdrawnReason ?? '' }
        : null,
      inForce: instead?.number ?? null,
      signers: (found.rounds[0]?.signoffs ?? []).map(({ role, personName, at }) => ({
        role: signOffRole(role),
        person: personName,
        at: at.toISOString(),
      })),
      report: (await currentReport(tx, row.id)).report,
      recipient: link.recipient,
      expiresAt: link.expiresAt.toISOString(),
      downloadsLeft: link.mostDownloads === null ? null : Math.max(0, link.mostDownloads - link.downloads),
      asksPassphrase: link.passphraseHash !== null,
    }
  },
})

/** Reads what a link leads to. Reading counts nothing and changes nothing, however often a mail scanner does it. */
export const openShare = (token: string): Promise<SharedReport> =>
  read(sharedReport, linkHolder('holder of a share link'), { token })
