import { readAttachment } from './read-attachment'
import { studyAttachmentName } from './sign-off-fields'
import type { ReportVerdict } from './verdict'
import type { VerificationContext } from './verification-context'
import { verifySignedReport } from './verify-signed-report'

/** A verdict with the study document that travels inside the file. */
export interface CheckedUpload {
  readonly verdict: ReportVerdict
  /** The attached study as its JSON text; null if there is none or it cannot be read. */
  readonly study: string | null
}

/** Checks a file and takes out its study. The study of a file that does not stand is given too: the reader is told which it is. */
export function checkUpload(bytes: Uint8Array, context: VerificationContext): CheckedUpload {
  return { verdict: verifySignedReport(bytes, context), study: readStudy(bytes) }
}

function readStudy(bytes: Uint8Array): string | null {
  try {
    const attached = readAttachment(bytes, studyAttachmentName)
    return attached ? new TextDecoder('utf-8', { fatal: true }).decode(attached) : null
  } catch {
    // Whatever is wrong with the file, the verdict says so.
    return null
  }
}
