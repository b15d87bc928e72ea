import 'server-only'
import * as z from 'zod'
import { DomainError } from '@/lib/errors'
import { can } from '@/lib/policy/can'
import { linkHolder } from '../actor'
import { now } from '../clock'
import { type Database, database } from '../db'
import { newId } from '../identity'
import { linkToken } from '../link-token'
import { verifyPassword } from '../people/password'
import { countAttempt, forgetAttempts } from '../people/sign-in-delay'
import { command, perform } from '../perform'
import { query, read } from '../read'
import { loadReportFile, type ReportFile } from '../revisions/report-file'
import { loadShare, shareScope } from './open-share'

/** Who asks for the file, as far as a request says. */
export interface Visitor {
  ipAddress: string | null
  userAgent: string | null
}

const lock = query({
  input: z.object({ token: linkToken }),
  scope: shareScope,
  load: ({ tx }, { token }) => loadShare(tx, token),
  may: (actor, { revision }) => can(actor, 'download-report', revision.subject),
  run: async (_context, _input, { link }) => ({
    shareId: link.id,
    recipient: link.recipient,
    passphraseHash: link.passphraseHash,
  }),
})

const handOut = command({
  input: z.object({
    token: linkToken,
    ipAddress: z.string().max(64).nullable(),
    userAgent: z.string().max(200).nullable(),
  }),
  scope: shareScope,
  // looked at again under the lock: of two downloads at once only as many are handed out as are left
  load: ({ tx }, { token }) => loadShare(tx, token),
  may: (actor, { revision }) => can(actor, 'download-report', revision.subject),
  run: async ({ tx, place: { organisationId }, at }, { ipAddress, userAgent }, { link, revision }) => {
    if (link.endedAt) throw new DomainError('not-found', 'This link was just ended.')
    if (link.mostDownloads !== null && link.downloads >= link.mostDownloads) {
      throw new DomainError('wrong-state', 'All downloads of this link are used: ask whoever sent it for another one.')
    }
    const file = await loadReportFile(tx, revision)
    const { sha256 } = file
    const where = { organisationId_id: { organisationId, id: link.id } }
    await tx.shareLink.update({ where, data: { downloads: { increment: 1 } } })
    const entry = { organisationId, id: newId(), linkId: link.id, at, ipAddress, userAgent, sha256 }
    await tx.shareDownload.create({ data: entry })
    const payload = { revisionId: link.revisionId, recipient: link.recipient, ipAddress, sha256 }
    return {
      answer: file,
      events: [{ action: 'report-downloaded', subject: { kind: 'share', id: link.id }, payload }],
    }
  },
})

/**
 * Hands the file out, unaltered, to whoever holds the link and, where one is set, knows the passphrase; counts and logs it.
 * @throws DomainError `not-found` for a link that is not in force, `forbidden` for a wrong passphrase, `too-many` while guesses are
 * held back, `wrong-state` when the downloads are used
 */
export async function downloadShared(
  token: string,
  passphrase: string,
  visitor: Visitor,
  db: Database = database(),
): Promise<ReportFile> {
  const { shareId, recipient, passphraseHash } = await read(lock, linkHolder('holder of a share link'), { token }, db)
  if (passphraseHash !== null) await requirePassphrase(db, shareId, passphrase, passphraseHash)
  const holder = linkHolder(`holder of the link for ${recipient}`)
  return perform(handOut, holder, { token, ...visitor, userAgent: visitor.userAgent?.slice(0, 200) ?? null }, db)
}

async function requirePassphrase(db: Database, shareId: string, given: string, hash: string): Promise<void> {
  const key = `share link ${shareId}`
  const seconds = await countAttempt(db, key, now())
  if (seconds > 0) {
    throw new DomainError('too-many', 'Too many wrong passphrases: wait a quarter of an hour and try again.')
  }
  // hashing something very long would only cost time
  if (given.length > 128 || !(await verifyPassword(hash, given))) {
    throw new DomainError('forbidden', 'The passphrase does not fit: it came apart from the link, type it again.')
  }
  await forgetAttempts(db, key)
}
