import type { FieldIssue } from '../../errors'

type Path = FieldIssue['path']

/** A list of issues of one check; nothing where the condition holds. */
export const unless = (holds: boolean, path: Path, message: string): FieldIssue[] => (holds ? [] : [{ path, message }])

/** The issue of a reference that leads nowhere. */
export const known = (
  records: ReadonlyMap<string, unknown>,
  id: string,
  path: Path,
  who: string,
  noun: string,
): FieldIssue[] =>
  unless(
    records.has(id),
    path,
    `${who} refers to ${noun} “${id}”, which does not exist; choose one that does, or add it.`,
  )

/** Positions of entries whose key stood earlier in the list. */
export const repeated = <T>(entries: readonly T[], keyOf: (entry: T) => string): number[] => {
  const seen = new Set<string>()
  return entries.flatMap((entry, index) => {
    const key = keyOf(entry)
    if (seen.has(key)) return [index]
    seen.add(key)
    return []
  })
}

/** Each motor once in a list. */
export const once = (entries: readonly { motor: string }[], path: FieldIssue['path'], who: string): FieldIssue[] =>
  repeated(entries, ({ motor }) => motor).map((i) => ({
    path: [...path, i, 'motor'],
    message: `Motor “${entries[i]?.motor}” stands twice in ${who}; remove one of the two.`,
  }))
