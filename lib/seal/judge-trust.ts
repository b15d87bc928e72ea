import type { Certificate } from './certificate'
import { sha256Hex } from './sha256'
import type { Trust } from './verdict'
import type { ListedCertificate, VerificationContext } from './verification-context'

/** Whether a certificate counts for a signature, and why, in one sentence. */
export interface TrustJudgement {
  readonly trust: Trust
  readonly sentence: string
}

const judge = (trust: Trust, sentence: string): TrustJudgement => ({ trust, sentence })
const day = (date: Date) => date.toISOString().slice(0, 10)

/**
 * Judges a certificate at the instant that the file states. That statement is covered by the signature but made by whoever signed: for a file
 * that is not registered it proves nothing once the key could be in other hands, so a certificate that has since been revoked or expired
 * counts only in a registered file.
 */
export function judgeTrust(
  certificate: Certificate,
  at: Date | undefined,
  context: VerificationContext,
  registered: boolean,
): TrustJudgement {
  const listed = context.listed.find((candidate) => sha256Hex(candidate.certificate) === certificate.fingerprint)
  if (!listed) return judge('unknown', 'This certificate is not on the organisation’s list.')
  if (!at || at > context.now) return judge('unknown', 'The file does not state a possible time of signing.')
  // The file states whole seconds.
  if (at.getTime() < Math.floor(listed.listedAt.getTime() / 1000) * 1000)
    return judge('unknown', `Signed before this certificate was listed on ${day(listed.listedAt)}.`)
  if (at < certificate.notBefore || at > certificate.notAfter) {
    return judge(
      'expired',
      `Signed outside the certificate’s validity, ${day(certificate.notBefore)} to ${day(certificate.notAfter)}.`,
    )
  }
  return judgeSince(certificate, at, listed, context.now, registered)
}

function judgeSince(
  certificate: Certificate,
  at: Date,
  listed: ListedCertificate,
  now: Date,
  registered: boolean,
): TrustJudgement {
  const { revokedAt } = listed
  if (revokedAt && revokedAt <= at)
    return judge('revoked', `Signed after this certificate was revoked on ${day(revokedAt)}.`)
  if (revokedAt && revokedAt <= now) {
    return registered
      ? judge(
          'trusted',
          `On the organisation’s list; revoked on ${day(revokedAt)}, after this signature, which stands.`,
        )
      : judge('revoked', `Revoked on ${day(revokedAt)}; nothing but the file itself says that it was signed before.`)
  }
  if (now > certificate.notAfter && !registered) {
    return judge(
      'expired',
      `Expired on ${day(certificate.notAfter)}; nothing but the file itself says that it was signed before.`,
    )
  }
  return judge('trusted', 'On the organisation’s list and in force when it was used.')
}
