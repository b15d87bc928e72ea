import type { StudyRunInput } from '../engine/study-run'
import { ENGINE_VERSION } from '../engine/version'
import { canonicalBytes } from './canonical-json'
import type { StudyDocument } from './document/study-document'
import { sha256Hex } from './sha-256'

/** Rises when the same engine input would be put down in another form. */
const inputForm = 1

/** Hash of the whole document: what a revision freezes and people sign. */
export const documentHash = (document: StudyDocument): Promise<string> => sha256Hex(canonicalBytes(document))

/**
 * Hash of what the engine computes from, with the form of that input and the engine's version: two equal hashes have
 * equal results, so a stored result can be used again; a change of words alone leaves it untouched.
 */
export const inputHash = (input: StudyRunInput, engineVersion: string = ENGINE_VERSION): Promise<string> =>
  sha256Hex(canonicalBytes({ form: inputForm, engineVersion, input }))
