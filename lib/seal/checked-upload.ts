import { readAttachment } from './read-attachment'
import { resultsAttachmentName, studyAttachmentName } from './sign-off-fields'
import type { ReportVerdict } from './verdict'
import type { VerificationContext } from './verification-context'
import { verifySignedReport } from './verify-signed-report'

/** A verdict with the data that travel inside the file. */
export interface CheckedUpload {
  readonly verdict: ReportVerdict
  /** The attached study as its JSON text; null if there is none or it cannot be read. */
  readonly study: string | null
  /** The attached summary of its results, likewise. */
  readonly results: string | null
}

/** Checks a file and takes out its data. Those of a file that does not stand are given too: the reader is told which it is. */
export function checkUpload(bytes: Uint8Array, context: VerificationContext): CheckedUpload {
  const verdict = verifySignedReport(bytes, context)
  return { verdict, study: readText(bytes, studyAttachmentName), results: readText(bytes, resultsAttachmentName) }
}

function readText(bytes: Uint8Array, name: string): string | null {
  try {
    const attached = readAttachment(bytes, name)
    return attached ? new TextDecoder('utf-8', { fatal: true }).decode(attached) : null
  } catch {
    // Whatever is wrong with the file, the verdict says so.
    return null
  }
}
