/** Whose change came first, when, and what it left. */
export interface Conflict {
  by: string
  at: string
  version: number
  theirs: Readonly<Record<string, unknown>>
}

/** Reads the detail of a refusal for a change of an older version; null where it is another refusal. */
export const readConflict = (detail: unknown): Conflict | null => {
  if (typeof detail !== 'object' || detail === null || !('theirs' in detail)) return null
  const { by, at, version, theirs } = detail as Partial<Conflict>
  if (typeof by !== 'string' || typeof at !== 'string' || typeof version !== 'number') return null
  return typeof theirs === 'object' && theirs !== null ? { by, at, version, theirs } : null
}
