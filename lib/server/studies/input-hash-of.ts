import 'server-only'
import { createHash } from 'node:crypto'
import { DomainError } from '@/lib/errors'
import { canonicalBytes } from '@/lib/study/canonical-json'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { inputHash } from '@/lib/study/study-hashes'
import { studyRunInput } from '@/lib/study/to-engine/study-run-input'

// Circuits estimated from nameplates make the engine's input dear to build, and a page asks for its hash each time it is shown.
const known = new Map<string, Promise<string>>()
const most = 200

/**
 * Hash of what would be computed from a document now, by the engine of this version.
 * @throws DomainError `invalid` for a document that cannot be computed
 */
export function inputHashOf(document: StudyDocument): Promise<string> {
  const { plant, schedules, cases, limits, settings, frequency } = document
  const parts = canonicalBytes({ plant, schedules, cases, limits, settings, frequency })
  const key = createHash('sha256').update(parts).digest('base64')
  const kept = known.get(key)
  if (kept) return kept
  const hash = inputHash(studyRunInput(document))
  if (known.size >= most) known.delete(known.keys().next().value ?? '')
  known.set(key, hash)
  return hash
}

/** The same for a page that only shows whether results are still those of the records: a document that cannot be computed has none. */
export async function inputHashIfAny(
  document: StudyDocument,
): Promise<{ hash: string | null; refusal: DomainError | null }> {
  try {
    return { hash: await inputHashOf(document), refusal: null }
  } catch (error) {
    if (error instanceof DomainError) return { hash: null, refusal: error }
    throw error
  }
}
