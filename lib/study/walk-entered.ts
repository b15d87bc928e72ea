import type { Entered } from './document/entered'

type Path = readonly (string | number)[]

/** An entered value and where it stands in the document. */
export interface EnteredAt {
  path: Path
  value: Entered
}

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null

/** Whether a part of a parsed document is an entered value; nothing else in it carries both a text and an SI value. */
export const isEntered = (value: unknown): value is Entered =>
  isObject(value) && typeof value.text === 'string' && typeof value.si === 'number' && 'quantity' in value

/** Every entered value of a parsed document, or of a part of it, in the order in which it stands there. */
export const walkEntered = (value: unknown, path: Path = []): EnteredAt[] => {
  if (isEntered(value)) return [{ path, value }]
  if (Array.isArray(value)) return value.flatMap((inner, index) => walkEntered(inner, [...path, index]))
  if (!isObject(value)) return []
  return Object.entries(value).flatMap(([key, inner]) => walkEntered(inner, [...path, key]))
}
