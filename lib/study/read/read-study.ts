import { DomainError, type FieldIssue, type Result } from '../../errors'
import { type StudyDocument, studyDocument } from '../document/study-document'
import { checkReferences } from '../references/check-references'
import { checkTexts } from './check-texts'
import { parseWithIssues } from './schema-issues'
import { upgrade } from './upgrade'

/** More issues than this are not read by anybody; the sentence says how many there are. */
const shownIssues = 50

/** A study of the largest permitted size stays well below this. */
const largestText = 20_000_000

const refuse = (all: readonly FieldIssue[]): Result<never> => {
  const what = all.length === 1 ? 'One thing is' : `${all.length} things are`
  const shown = all.length > shownIssues ? `; the first ${shownIssues} are listed` : ''
  const message = `${what} wrong in this study${shown}.`
  return { ok: false, error: new DomainError('invalid', message, all.slice(0, shownIssues)) }
}

/** Checks a parsed value: version, shape, texts against values, references; the first stage that finds something answers. */
export const readStudyValue = (value: unknown): Result<StudyDocument> => {
  const upgraded = upgrade(value)
  if (!upgraded.ok) return upgraded
  const parsed = parseWithIssues(studyDocument, upgraded.value)
  if (!parsed.ok) return refuse(parsed.issues)
  const texts = checkTexts(parsed.value)
  if (texts.length > 0) return refuse(texts)
  const references = checkReferences(parsed.value)
  return references.length > 0 ? refuse(references) : { ok: true, value: parsed.value }
}

const lineAndColumn = (text: string, error: unknown): string => {
  const position = /position (\d+)/.exec(error instanceof Error ? error.message : '')?.[1]
  if (position === undefined) return ''
  const before = text.slice(0, Number(position)).split('\n')
  return ` near line ${before.length}, column ${(before.at(-1)?.length ?? 0) + 1}`
}

/** Reads the text of a study file. What is wrong comes as a refusal with one sentence a field. */
export const readStudy = (text: string): Result<StudyDocument> => {
  if (text.length > largestText)
    return { ok: false, error: new DomainError('too-large', 'A study file holds at most 20 million characters.') }
  let value: unknown
  try {
    value = JSON.parse(text.replace(/^\uFEFF/, ''))
  } catch (error) {
    const message = `This file is not written as JSON${lineAndColumn(text, error)}; correct it there.`
    return { ok: false, error: new DomainError('invalid', message, [{ path: [], message }]) }
  }
  return readStudyValue(value)
}
