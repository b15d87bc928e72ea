import { readCertificate } from './certificate'
import type { CheckedSignature } from './check-signature'
import { sha256Hex } from './sha256'
import type { Finding } from './verdict'
import type { ListedCertificate, VerificationContext } from './verification-context'

/**
 * Checks who signed against who should have: a file cut back to an earlier signature looks whole by itself, and a certificate made for the
 * purpose can carry anybody's name.
 */
export function signerFindings(signatures: readonly CheckedSignature[], context: VerificationContext): Finding[] {
  if (signatures.length === 0) return []
  const signed = signatures.map(({ entry }) => entry.name)
  const missing = context.expected.filter((field) => !signed.includes(field))
  const findings: Finding[] = missing.map((field) => ({
    kind: 'missing-signer',
    sentence: `The sign-off "${field}" is missing.`,
    field,
  }))
  const inOrder = context.expected.filter((field) => signed.includes(field))
  if (signed.filter((field) => context.expected.includes(field)).join('\n') !== inOrder.join('\n')) {
    findings.push({ kind: 'order', sentence: 'The sign-offs were not given in the order in which they must be.' })
  }
  return [...findings, ...repeated(signatures), ...lookAlikes(signatures, context.listed)]
}

function repeated(signatures: readonly CheckedSignature[]): Finding[] {
  const roles = new Map<string, string>()
  return signatures.flatMap(({ entry, parts }) => {
    if (!parts) return []
    const fingerprint = sha256Hex(parts.certificate)
    const earlier = roles.get(fingerprint)
    roles.set(fingerprint, entry.role)
    if (earlier === undefined) return []
    return [
      { kind: 'same-signer', sentence: `"${earlier}" and "${entry.role}" are the same person’s.`, field: entry.name },
    ]
  })
}

function lookAlikes(signatures: readonly CheckedSignature[], listed: readonly ListedCertificate[]): Finding[] {
  const fingerprints = new Set(listed.map(({ certificate }) => sha256Hex(certificate)))
  return signatures.flatMap(({ entry, parts }) => {
    if (!parts || fingerprints.has(sha256Hex(parts.certificate))) return []
    const { subject } = readCertificate(parts.certificate)
    const twin = listed
      .map(({ certificate }) => readCertificate(certificate).subject)
      .find((other) => isLike(subject, other))
    if (!twin) return []
    const sentence = `"${entry.role}" carries the name of ${twin.name}, but it is not a certificate that was issued to that person.`
    return [{ kind: 'look-alike', sentence, field: entry.name }]
  })
}

/** Names that a reader takes for the same. */
function isLike(a: { name: string; email: string }, b: { name: string; email: string }): boolean {
  const plain = (text: string) => text.normalize('NFKC').toLowerCase().replace(/\s+/g, ' ').trim()
  return plain(a.name) === plain(b.name) || (a.email !== '' && plain(a.email) === plain(b.email))
}
