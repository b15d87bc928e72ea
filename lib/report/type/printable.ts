import type { FieldIssue } from '@/lib/errors'
import { faces, fontFor } from './faces'

/** A text as it can be printed: composed letters, plain spaces for tabs, no invisible characters. */
export const printable = (text: string): string =>
  text
    .normalize('NFC')
    .replace(/\r\n?|[\u2028\u2029]/g, '\n')
    .replace(/[\t\v\f]/g, ' ')
    // Joiners, marks of direction and soft hyphens show nothing, and no font of the report has a glyph for all of them.
    .replace(/[\u00ad\u200b-\u200f\u202a-\u202e\u2060-\u2064\ufeff]/g, '')

const unprintable = (text: string): string[] => {
  const face = faces().regular
  return [...new Set(printable(text))].filter(
    (character) => character !== '\n' && fontFor(face, character.codePointAt(0) ?? 0) === null,
  )
}

const codeOf = (character: string): string =>
  `U+${(character.codePointAt(0) ?? 0).toString(16).toUpperCase().padStart(4, '0')}`

type Path = readonly (string | number)[]

/** Every text within a value that holds a letter which no embedded font can print; a missing glyph must never print as another letter. */
export const glyphIssues = (value: unknown, path: Path = []): FieldIssue[] => {
  if (typeof value === 'string') {
    const missing = unprintable(value)
    if (missing.length === 0) return []
    const named = missing.map((character) => `“${character}” (${codeOf(character)})`).join(', ')
    return [{ path, message: `The report has no letter for ${named}; write this text without it.` }]
  }
  if (Array.isArray(value)) return value.flatMap((inner, i) => glyphIssues(inner, [...path, i]))
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, inner]) => glyphIssues(inner, [...path, key]))
}
