import type { Finding, FindingKind, OverallVerdict, SignatureVerdict } from './verdict'

/** Findings that speak of the set of signers, not of a file that was tampered with. */
const aboutSigners = new Set<FindingKind>(['look-alike', 'missing-signer', 'same-signer', 'order'])

/** The verdict on the whole file, from its signatures and defects. */
export function overallVerdict(
  signatures: readonly SignatureVerdict[],
  findings: readonly Finding[],
  expected: readonly string[],
): OverallVerdict {
  const defects = findings.filter((finding) => !aboutSigners.has(finding.kind))
  if (signatures.length === 0) return defects.length > 0 ? 'changed' : 'not-signed'
  // Somebody else's signed file is not a tampered report of ours.
  const foreign = signatures.every(({ trust, field }) => trust === 'unknown' && !expected.includes(field))
  if (foreign) return 'unknown-signer'
  if (defects.length > 0) return 'changed'
  if (signatures.some(({ trust }) => trust !== 'trusted')) return 'unknown-signer'
  return findings.length > 0 ? 'incomplete' : 'valid'
}

/** One sentence that says what the verdict means for the reader and what to do. */
export function overallSentence(overall: OverallVerdict, registered: boolean): string {
  if (overall === 'valid') return registered ? issued : standing
  return sentences[overall]
}

const issued = 'This is, byte for byte, a report that the organisation has issued; all its signatures stand.'
const standing =
  'All signatures stand and their certificates are on the organisation’s list, but this file is not in the register of issued reports: ask the organisation before you rely on it.'

const sentences: Record<Exclude<OverallVerdict, 'valid'>, string> = {
  changed: 'Do not rely on this file: it is not what was signed. Ask for the report as issued.',
  incomplete:
    'Not every sign-off is on this file: it may be an unfinished state or a report cut back. Ask for the report as issued.',
  'unknown-signer':
    'Do not rely on this file: it is signed, but not by people whose certificates count here. Ask for the report as issued.',
  'not-signed': 'This file carries no signature of an issued report: nothing can be said about who stands behind it.',
  unreadable: 'This file cannot be read as a report.',
}
