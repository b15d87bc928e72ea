import type { StudyDocument } from '../document/study-document'
import { fieldPlace } from '../field-place'
import { isEntered } from '../walk-entered'

/** One value of a document with its place, as one says it. */
export interface Leaf {
  /** Identities that lead to it; the same in every revision. */
  anchor: string
  record: string
  field: string
  text: string
}

type Path = readonly (string | number)[]

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null

const textOf = (value: unknown): string | null => {
  if (isEntered(value)) return value.text
  if (typeof value === 'string') return value
  if (typeof value === 'number') return String(value)
  return typeof value === 'boolean' ? (value ? 'yes' : 'no') : null
}

function* walk(value: unknown, path: Path): Generator<{ path: Path; text: string; source: string | null }> {
  const text = textOf(value)
  if (text !== null) {
    const source = isEntered(value) && value.provenance ? `${value.provenance.kind}: ${value.provenance.source}` : null
    if (text !== '') yield { path, text, source }
    return
  }
  if (Array.isArray(value)) {
    for (const [i, inner] of value.entries()) yield* walk(inner, [...path, i])
  } else if (isObject(value)) {
    // the identity is in the anchor; what it is called is a value
    for (const [key, inner] of Object.entries(value)) if (key !== 'id') yield* walk(inner, [...path, key])
  }
}

/** Every value of a document that somebody entered or chose, by its anchor; where a source is stated, that is a value too. */
export const leavesOf = (document: StudyDocument): ReadonlyMap<string, Leaf> => {
  const leaves = new Map<string, Leaf>()
  for (const { path, text, source } of walk(document, [])) {
    const { anchor, record, field } = fieldPlace(document, path)
    leaves.set(anchor, { anchor, record, field, text })
    if (source)
      leaves.set(`${anchor}/source`, { anchor: `${anchor}/source`, record, field: `source of ${field}`, text: source })
  }
  return leaves
}
