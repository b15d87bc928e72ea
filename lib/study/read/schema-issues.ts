import type * as z from 'zod'
import type { FieldIssue } from '../../errors'
import { issueSentence } from './issue-words'

const plainPath = (path: readonly PropertyKey[]): (string | number)[] =>
  path.map((step) => (typeof step === 'symbol' ? String(step) : step))

/** How well a branch of a choice fits what was given: one that only says “not this kind of thing” fits worst. */
const misfit = (branch: readonly z.core.$ZodIssue[]): number =>
  branch.some((issue) => issue.code === 'invalid_type' && issue.path.length === 0) ? 1000 : branch.length

/** The issue itself or, for a choice of forms, the issues of the form that was most likely meant. */
const meant = (issue: z.core.$ZodIssue): readonly z.core.$ZodIssue[] => {
  if (issue.code !== 'invalid_union') return [issue]
  const nearest = [...issue.errors].sort((a, b) => misfit(a) - misfit(b))[0]
  if (!nearest || misfit(nearest) >= 1000) return [issue]
  return nearest.flatMap(meant).map((inner) => ({ ...inner, path: [...issue.path, ...inner.path] }))
}

const optionsOf = (issue: z.core.$ZodIssue): readonly unknown[] =>
  issue.code === 'invalid_union' && 'options' in issue && Array.isArray(issue.options) ? issue.options : []

const sentence = (issue: z.core.$ZodIssue): string => {
  const options = optionsOf(issue)
  if (options.length > 0)
    return issueSentence({ ...issue, code: 'invalid_value', values: options.map(String) }, issue.input)
  // A choice of forms without one that fits is an entered value: nothing else in the document is one.
  if (issue.code === 'invalid_union')
    return issue.input === undefined
      ? 'This value is missing; give it with its unit in quotation marks, for example "11 kV".'
      : 'Write this value with its unit in quotation marks, for example "11 kV".'
  return issue.message
}

/** Parses by a schema; what is wrong comes as one plain sentence a field. */
export const parseWithIssues = <S extends z.ZodType>(
  schema: S,
  value: unknown,
): { ok: true; value: z.output<S> } | { ok: false; issues: FieldIssue[] } => {
  const parsed = schema.safeParse(value, {
    reportInput: true,
    error: (issue) => issueSentence(issue as z.core.$ZodIssue, issue.input),
  })
  if (parsed.success) return { ok: true, value: parsed.data }
  const issues = parsed.error.issues
    .flatMap(meant)
    .map((issue) => ({ path: plainPath(issue.path), message: sentence(issue) }))
  return { ok: false, issues }
}
