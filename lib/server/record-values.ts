import type * as z from 'zod'
import { DomainError, type FieldIssue } from '@/lib/errors'
import { checkTexts } from '@/lib/study/read/check-texts'
import { parseWithIssues } from '@/lib/study/read/schema-issues'

/**
 * The values of one record, validated by the schema of their kind and each text against the value stored beside it.
 * The paths of the issues begin with `below`, where the values stand in the input.
 * @throws DomainError `invalid`
 */
export function readValues<Shape extends z.ZodType<object>>(
  schema: Shape,
  values: unknown,
  below: readonly (string | number)[],
): z.output<Shape> {
  const parsed = parseWithIssues(schema, values)
  const issues = parsed.ok ? checkTexts(parsed.value) : parsed.issues
  if (parsed.ok && issues.length === 0) return parsed.value
  throw invalidRecord(issues.map((issue) => ({ ...issue, path: [...below, ...issue.path] })))
}

export const invalidRecord = (issues: readonly FieldIssue[]): DomainError =>
  new DomainError('invalid', 'The record cannot be kept as it is: correct the marked fields.', issues)
