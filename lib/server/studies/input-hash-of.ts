import { ENGINE_VERSION } from '@/lib/engine/version'
import { canonicalBytes } from '@/lib/study/canonical-json'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { sha256Hex } from '@/lib/study/sha-256'

/** Hash of what would be computed from a document now, by the engine of this version. */
export function inputHashOf(document: StudyDocument): Promise<string> {
  const { plant, schedules, cases, limits, settings, frequency } = document
  return sha256Hex(canonicalBytes({ engine: ENGINE_VERSION, plant, schedules, cases, limits, settings, frequency }))
}
