import type { ProvenanceKind } from '@/lib/quantity/provenance'
import type { NumberStyle } from '@/lib/quantity/quantity-name'

/** What stands in the form: always the text as typed, also where it cannot be read yet. */
export type Draft = TextDraft | FlagDraft | ManyDraft | QuantityDraft | SourceDraft | GroupDraft | ListDraft

export interface TextDraft {
  is: 'text'
  text: string
}

export interface FlagDraft {
  is: 'flag'
  on: boolean
}

export interface ManyDraft {
  is: 'many'
  all: boolean
  values: readonly string[]
}

/** Kind is empty until the source is stated. */
export interface SourceDraft {
  is: 'source'
  kind: ProvenanceKind | ''
  source: string
}

export interface QuantityDraft {
  is: 'quantity'
  text: string
  style: NumberStyle
  from: SourceDraft
}

/** `choice` is the shape in use; the parts of the other shapes keep their text. */
export interface GroupDraft {
  is: 'group'
  on: boolean
  choice: string
  parts: Readonly<Record<string, Draft>>
}

interface ListRow {
  key: string
  group: GroupDraft
}

export interface ListDraft {
  is: 'list'
  rows: readonly ListRow[]
}

/** From the record's root; a number is a row of a list, an empty name the record's own shape. */
export type DraftPath = readonly (string | number)[]

/** The same draft with one part replaced; a path that leads nowhere changes nothing. */
export const withDraftAt = <T extends Draft>(draft: T, path: DraftPath, value: Draft): T => {
  const changed = replaced(draft, path, value)
  return changed.is === draft.is ? { ...draft, ...changed } : draft
}

const replaced = (draft: Draft, path: DraftPath, value: Draft): Draft => {
  const [head, ...rest] = path
  if (head === undefined) return value
  if (draft.is === 'group') {
    const part = draft.parts[head]
    return part ? { ...draft, parts: { ...draft.parts, [head]: replaced(part, rest, value) } } : draft
  }
  if (draft.is !== 'list') return draft
  return {
    ...draft,
    rows: draft.rows.map((row, index) => {
      if (index !== Number(head)) return row
      const group = replaced(row.group, rest, value)
      return group.is === 'group' ? { ...row, group } : row
    }),
  }
}

/** The path that a refusal names: the same without the empty names. */
export const valuePath = (path: DraftPath): DraftPath => path.filter((part) => part !== '')

export const samePath = (a: DraftPath, b: DraftPath): boolean =>
  a.length === b.length && a.every((part, index) => String(part) === String(b[index]))
