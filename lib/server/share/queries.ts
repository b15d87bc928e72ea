import 'server-only'
import { can } from '@/lib/policy/can'
import { query } from '../read'
import { ofRevision } from '../revisions/schema'
import { loadRevision } from '../revisions/subject'

export interface ShareLine {
  shareId: string
  recipient: string
  createdBy: string
  createdAt: string
  expiresAt: string
  downloads: number
  mostDownloads: number | null
  hasPassphrase: boolean
  /** Why it no longer opens; null while it does. */
  over: 'ended' | 'run out' | 'used up' | null
  log: { at: string; ipAddress: string | null; sha256: string }[]
}

/** The links by which a report was handed out, newest first, with who downloaded when. */
export const shareLinks = query({
  input: ofRevision,
  scope: ({ revisionId }) => ({ kind: 'revision' as const, id: revisionId }),
  load: async ({ tx }, { revisionId }) => loadRevision(tx, revisionId),
  may: (actor, { subject }) => can(actor, 'end-share', subject),
  run: async ({ tx, at }, { revisionId }): Promise<ShareLine[]> => {
    const rows = await tx.shareLink.findMany({
      where: { revisionId },
      include: { log: { orderBy: { at: 'desc' }, take: 50 } },
      orderBy: { createdAt: 'desc' },
    })
    return rows.map((row) => ({
      shareId: row.id,
      recipient: row.recipient,
      createdBy: row.createdByName,
      createdAt: row.createdAt.toISOString(),
      expiresAt: row.expiresAt.toISOString(),
      downloads: row.downloads,
      mostDownloads: row.mostDownloads,
      hasPassphrase: row.passphraseHash !== null,
      over: row.endedAt
        ? 'ended'
        : row.expiresAt <= at
          ? 'run out'
          : row.mostDownloads !== null && row.downloads >= row.mostDownloads
            ? 'used up'
            : null,
      log: row.log.map(({ at: when, ipAddress, sha256 }) => ({ at: when.toISOString(), ipAddress, sha256 })),
    }))
  },
})
