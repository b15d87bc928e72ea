import { canonicalBytes } from '@/lib/study/canonical-json'
import { summarise } from '@/lib/study/summary'
import type { ReportInput } from '../report-input'

/** A file that goes into the report. */
export interface Attachment {
  name: string
  bytes: Uint8Array
  description: string
}

/**
 * The study document in its canonical bytes, whose SHA-256 is the document hash that the cover prints, and beside it the
 * results without their curves, with the hashes and the version that they belong to.
 */
export const attachmentsOf = ({ document, frozenDocument, result, revision }: ReportInput): readonly Attachment[] => [
  {
    name: 'study.json',
    bytes: frozenDocument ?? canonicalBytes(document),
    description: 'Study document in canonical form (RFC 8785); its SHA-256 is printed on the cover.',
  },
  {
    name: 'results.json',
    bytes: canonicalBytes({
      format: 'breakaway-results',
      formatVersion: 1,
      engineVersion: result.engineVersion,
      documentHash: revision.documentHash,
      inputHash: revision.inputHash,
      revision: revision.number,
      frozenAt: revision.frozenAt,
      summary: summarise(result),
    }),
    description: 'Results of all cases in SI units, without their curves.',
  },
]
