import 'server-only'
import { createHash } from 'node:crypto'
import type { CheckedUpload } from '@/lib/seal/checked-upload'
import type { ReportVerdict } from '@/lib/seal/verdict'
import type { VerificationContext } from '@/lib/seal/verification-context'
import { now } from '../clock'
import { type Database, database, type Tx } from '../db'
import { enterAsReader } from '../enter'
import { revisionState } from '../revisions/subject'
import { checkInThread } from './check-in-thread'
import { expectedFields } from './order-of'

/** What became of the revision whose file this is. */
export type Standing =
  | { kind: 'unknown' }
  | {
      kind: 'issued' | 'superseded' | 'withdrawn'
      organisation: string
      title: string
      documentNumber: string
      number: number
      issuedAt: string | null
      purpose: string | null
      /** The revision that is issued now, where this one is superseded. */
      current: { number: number } | null
      withdrawnReason: string | null
    }

export interface VerifiedUpload {
  verdict: ReportVerdict
  standing: Standing
  /** Organisation whose list of certificates was used; null where neither file nor certificate is known here. */
  organisation: string | null
  /** The attached study as its JSON text; null if there is none. */
  study: string | null
}

interface Known {
  organisation: string
  listed: VerificationContext['listed']
  standing: Standing
}

/**
 * Says what holds of a file that somebody dropped, without an account: found by the file's own hash, else by the fingerprint of a
 * certificate in it; never by a name.
 */
export async function verifyUpload(bytes: Uint8Array, db: Database = database()): Promise<VerifiedUpload> {
  const digest = createHash('sha256').update(bytes).digest('hex')
  const known = await knownBy(db, 'report', digest)
  if (known) return present(await check(bytes, known, [digest]), known)
  const first = await check(bytes, null, [])
  for (const { fingerprint } of first.verdict.signatures) {
    const signer = await knownBy(db, 'certificate', fingerprint)
    if (signer) return present(await check(bytes, signer, []), signer)
  }
  return present(first, null)
}

const check = (bytes: Uint8Array, known: Known | null, registered: string[]): Promise<CheckedUpload> =>
  checkInThread(bytes, { registered, listed: known?.listed ?? [], expected: expectedFields, now: now() })

const present = ({ verdict, study }: CheckedUpload, known: Known | null): VerifiedUpload => ({
  verdict,
  study,
  standing: known?.standing ?? { kind: 'unknown' },
  organisation: known?.organisation ?? null,
})

async function knownBy(db: Database, kind: 'report' | 'certificate', digest: string): Promise<Known | null> {
  if (!/^[0-9a-f]{64}$/.test(digest)) return null
  return db.$transaction(async (tx) => {
    const entry = await enterAsReader(tx, kind, digest)
    if (!entry) return null
    const { organisationId, subjectId } = entry
    const { name } = await tx.organisation.findUniqueOrThrow({ where: { id: organisationId } })
    const certificates = await tx.certificate.findMany({ where: { organisationId } })
    return {
      organisation: name,
      listed: certificates.map(({ certificate, listedAt, revokedAt }) => ({
        certificate,
        listedAt,
        revokedAt: revokedAt ?? undefined,
      })),
      standing: kind === 'report' ? await standingOf(tx, subjectId, name) : { kind: 'unknown' },
    }
  })
}

async function standingOf(tx: Tx, revisionId: string, organisation: string): Promise<Standing> {
  const row = await tx.revision.findFirstOrThrow({
    where: { id: revisionId },
    include: { study: { select: { title: true, documentNumber: true } } },
  })
  const kind = revisionState(row.state)
  if (kind !== 'issued' && kind !== 'superseded' && kind !== 'withdrawn') return { kind: 'unknown' }
  const current =
    kind === 'superseded'
      ? await tx.revision.findFirst({ where: { studyId: row.studyId, state: 'issued' }, select: { number: true } })
      : null
  return {
    kind,
    organisation,
    title: row.study.title,
    documentNumber: row.study.documentNumber,
    number: row.number,
    issuedAt: row.issuedAt?.toISOString() ?? null,
    purpose: row.purpose,
    current,
    withdrawnReason: row.withdrawnReason,
  }
}
