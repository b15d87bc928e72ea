import type * as z from 'zod'

const kindWords: Record<string, string> = {
  string: 'a text in quotation marks',
  number: 'a number without a unit',
  int: 'a whole number',
  boolean: 'true or false',
  array: 'a list in square brackets',
  object: 'a record in braces',
  null: 'null',
}

const typeOf = (input: unknown): string =>
  input === null ? 'null' : Array.isArray(input) ? 'array' : typeof input === 'number' ? 'number' : typeof input

const words = (kind: string): string => kindWords[kind] ?? kind

const quoted = (values: readonly unknown[]): string => {
  const all = values.map((value) => (typeof value === 'string' ? `“${value}”` : String(value)))
  return all.length < 2 ? all.join('') : `${all.slice(0, -1).join(', ')} or ${all.at(-1)}`
}

const tooSmall = (issue: z.core.$ZodIssueTooSmall): string => {
  const { origin, minimum, inclusive } = issue
  if (origin === 'string') return 'This text cannot be empty.'
  if (origin === 'array') return `Give at least ${minimum}.`
  return inclusive ? `This cannot be below ${minimum}.` : `This must be above ${minimum}.`
}

const tooBig = (issue: z.core.$ZodIssueTooBig): string => {
  const { origin, maximum, inclusive } = issue
  if (origin === 'string') return `Keep this within ${maximum} characters.`
  if (origin === 'array') return `Give at most ${maximum}.`
  return inclusive ? `This cannot be above ${maximum}.` : `This must be below ${maximum}.`
}

const invalidType = (issue: z.core.$ZodIssueInvalidType, input: unknown): string =>
  input === undefined
    ? `This is missing; give ${words(issue.expected)}.`
    : `Give ${words(issue.expected)} here, not ${words(typeOf(input))}.`

/** One sentence in plain words for what a schema found; sentences written beside the schema itself come first. */
export const issueSentence = (issue: z.core.$ZodIssue, input: unknown): string => {
  switch (issue.code) {
    case 'invalid_type':
      return invalidType(issue, input)
    case 'too_small':
      return tooSmall(issue)
    case 'too_big':
      return tooBig(issue)
    case 'invalid_value':
      return input === undefined
        ? `This is missing; give ${quoted(issue.values)}.`
        : `Give ${quoted(issue.values)} here.`
    case 'unrecognized_keys':
      return `${quoted(issue.keys)} is not known here; remove it or correct its name.`
    case 'invalid_format':
      return issue.format === 'date'
        ? 'Write the date as year-month-day, for example 2026-05-12.'
        : 'This has the wrong form.'
    case 'invalid_union':
      return 'This has the wrong form.'
    default:
      return issue.message
  }
}
