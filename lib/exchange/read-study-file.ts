import { DomainError, type Result } from '../errors'
import type { StudyDocument } from '../study/document/study-document'
import { readStudy } from '../study/read/read-study'

/** A study of the largest permitted size stays well below this. */
const largestFile = 20 * 1024 * 1024

/** A study nests nine deep; more than this is not one, and deep nesting can exhaust what reads it. */
const deepest = 32

const refuse = (code: 'too-large' | 'unsupported' | 'invalid', message: string): Result<never> => ({
  ok: false,
  error: new DomainError(code, message, [{ path: [], message }]),
})

/** Largest depth of brackets and braces outside texts. */
const depthOf = (text: string): number => {
  let depth = 0
  let most = 0
  let inText = false
  for (let i = 0; i < text.length; i++) {
    const code = text.charCodeAt(i)
    if (inText) {
      if (code === 0x5c) i++
      else if (code === 0x22) inText = false
    } else if (code === 0x22) inText = true
    else if (code === 0x5b || code === 0x7b) most = Math.max(most, ++depth)
    else if (code === 0x5d || code === 0x7d) depth--
  }
  return most
}

const decode = (bytes: Uint8Array): string | null => {
  try {
    return new TextDecoder('utf-8', { fatal: true }).decode(bytes)
  } catch {
    return null
  }
}

/**
 * Reads a study file as it comes from a disk or an upload: at most 20 MB of UTF-8 text that holds a study of this or an
 * older version of the format. What is wrong comes as a refusal with one sentence that says what to do.
 */
export const readStudyFile = (bytes: Uint8Array): Result<StudyDocument> => {
  if (bytes.length > largestFile)
    return refuse(
      'too-large',
      `A study file is at most 20 MB, and this one has ${Math.ceil(bytes.length / 1048576)} MB.`,
    )
  if (bytes.length === 0) return refuse('invalid', 'This file is empty; choose a study file.')
  // %PDF- and PK: the two that people hand over by mistake.
  const start = String.fromCharCode(...bytes.subarray(0, 5))
  if (start === '%PDF-')
    return refuse('unsupported', 'This is a PDF; take the study file out of its attachments and hand that over.')
  if (start.startsWith('PK'))
    return refuse('unsupported', 'This is a packed folder or a spreadsheet; hand over the study file itself (.json).')
  const text = decode(bytes)
  if (text === null) return refuse('unsupported', 'This file is not UTF-8 text; save the study file as UTF-8.')
  if (depthOf(text) > deepest) return refuse('invalid', 'This is not a study file: its records are nested too deeply.')
  return readStudy(text)
}
