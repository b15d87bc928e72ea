import type * as z from 'zod'
import { DomainError, type FieldIssue } from '@/lib/errors'
import { parseWithIssues } from '@/lib/study/read/schema-issues'

/** What came in, validated; the database cannot store some characters, so they are refused here. */
export function parseInput<Shape extends z.ZodType>(shape: Shape, input: unknown): z.output<Shape> {
  const unusable = unusableTexts(input, [])
  if (unusable.length > 0) throw new DomainError('invalid', unreadable, unusable)
  const parsed = parseWithIssues(shape, input)
  if (parsed.ok) return parsed.value
  throw new DomainError('invalid', unreadable, parsed.issues)
}

const unreadable = 'Some of what was entered cannot be used: correct the marked fields.'

/** Beyond this depth nothing of ours is nested. */
const deepest = 40

function unusableTexts(value: unknown, path: (string | number)[]): FieldIssue[] {
  if (path.length > deepest) return [{ path, message: 'This is nested too deeply.' }]
  if (typeof value === 'string') {
    return value.includes('\0') || !value.isWellFormed()
      ? [{ path, message: 'Remove the characters that cannot be printed.' }]
      : []
  }
  if (typeof value !== 'object' || value === null || value instanceof Uint8Array) return []
  return Object.entries(value).flatMap(([key, inner]) =>
    unusableTexts(inner, [...path, Array.isArray(value) ? Number(key) : key]),
  )
}
