import { DomainError } from '@/lib/errors'
import { readCertificate } from './certificate'
import { checkRevision } from './check-revision'
import { type CheckedSignature, checkSignature } from './check-signature'
import { signerFindings } from './check-signers'
import { judgeTrust } from './judge-trust'
import { mentionsSignature } from './mentions-signature'
import { overallSentence, overallVerdict } from './overall-verdict'
import { type PdfFile, readRevisions } from './pdf-revisions'
import { entry, PdfView } from './pdf-view'
import { sha256Hex } from './sha256'
import { signatureEntries, textOf } from './signature-entries'
import type { Finding, OverallVerdict, ReportVerdict, SignatureVerdict } from './verdict'
import type { VerificationContext } from './verification-context'

/**
 * Says what a signed report is worth: whether it is a registered file, whether each signature holds and its certificate counts, and what has
 * been done to the file since. It never throws for anything a file can hold; it can take long for a hostile one, so it belongs in a thread.
 */
export function verifySignedReport(bytes: Uint8Array, context: VerificationContext): ReportVerdict {
  const sha256 = sha256Hex(bytes)
  const registered = context.registered.includes(sha256)
  try {
    return { sha256, registered, ...judgeFile(readRevisions(bytes), context, registered) }
  } catch (error) {
    // A file can be bad in more ways than can be listed; one that exhausts the stack is bad, too.
    if (!(error instanceof DomainError) && !(error instanceof RangeError)) throw error
    return { sha256, registered, signatures: [], ...refuse(bytes, error) }
  }
}

function judgeFile(file: PdfFile, context: VerificationContext, registered: boolean) {
  const view = new PdfView(file)
  const checked = signatureEntries(view).flatMap((entry) => (entry.signature ? [checkSignature(view, entry)] : []))
  checked.sort((a, b) => a.revision - b.revision)
  const revisionFindings = file.revisions.map((_, index) => (index === 0 ? [] : checkRevision(file, index)))
  const trailing = trailingFindings(file)
  const findings = [
    ...revisionFindings.flat(),
    ...trailing,
    ...checked.flatMap((signature) => signature.findings),
    ...signerFindings(checked, context),
  ]
  const signatures = checked.map((signature) => {
    const later = revisionFindings.slice(signature.revision + 1).flat().length + trailing.length
    return presentSignature(view, signature, context, registered, later === 0)
  })
  const overall = overallVerdict(signatures, findings, context.expected)
  return { overall, sentence: overallSentence(overall, registered), signatures, findings }
}

function trailingFindings({ bytes, revisions }: PdfFile): Finding[] {
  const rest = bytes.length - revisions.at(-1)!.end
  if (rest === 0) return []
  return [{ kind: 'trailing-bytes', sentence: `${rest} bytes were appended behind the end of the file.` }]
}

function presentSignature(
  view: PdfView,
  { entry: signed, revision, end, parts, at, findings }: CheckedSignature,
  context: VerificationContext,
  registered: boolean,
  untouchedSince: boolean,
): SignatureVerdict {
  const dict = signed.signature?.dict
  const text = (key: string) => textOf(view.resolve(entry(dict, key)))
  const certificate = parts && readCertificate(parts.certificate)
  const judgement = certificate
    ? judgeTrust(certificate, at, context, registered)
    : { trust: 'unknown' as const, sentence: 'The signer’s certificate cannot be read.' }
  const intact = findings.length === 0
  return {
    field: signed.name,
    role: signed.role,
    signer: certificate?.subject ?? { name: text('Name'), email: '', organisation: '' },
    fingerprint: certificate?.fingerprint ?? '',
    signedAt: at?.toISOString() ?? null,
    reason: text('Reason'),
    trust: judgement.trust,
    trustSentence: judgement.sentence,
    covers: {
      bytes: end,
      ofBytes: view.file.bytes.length,
      revision: revision + 1,
      ofRevisions: view.file.revisions.length,
    },
    intact,
    stands: intact && untouchedSince,
  }
}

/** The verdict on a file that cannot be read as a report is written. */
function refuse(
  bytes: Uint8Array,
  error: DomainError | RangeError,
): { overall: OverallVerdict; sentence: string; findings: Finding[] } {
  const sentence = error instanceof DomainError ? error.message : 'The file is nested deeper than any report.'
  const findings: Finding[] = [{ kind: 'structure', sentence }]
  if (error instanceof DomainError && error.code === 'too-large') return { overall: 'unreadable', sentence, findings }
  if (mentionsSignature(bytes)) return { overall: 'changed', sentence: overallSentence('changed', false), findings }
  if (error instanceof DomainError && error.code === 'unsupported') {
    return { overall: 'not-signed', sentence: overallSentence('not-signed', false), findings: [] }
  }
  return { overall: 'unreadable', sentence, findings }
}
