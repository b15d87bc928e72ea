import type { StudyDocument } from '../document/study-document'
import { readStudyValue } from './read-study'

/**
 * A study from the bytes in which it was frozen, brought up to the shape of this version: what later versions added
 * stands at its default. The bytes were validated when they were frozen; where they can no longer be read, it throws.
 */
export const readFrozenStudy = (bytes: Uint8Array): StudyDocument => {
  const read = readStudyValue(JSON.parse(new TextDecoder().decode(bytes)))
  if (!read.ok) throw read.error
  return read.value
}
