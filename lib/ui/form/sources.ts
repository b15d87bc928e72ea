import type { ProvenanceKind } from '@/lib/quantity/provenance'
import type { Draft, GroupDraft } from './draft'

const partsOf = (draft: Draft): readonly Draft[] => {
  if (draft.is === 'group') return Object.values(draft.parts)
  return draft.is === 'list' ? draft.rows.map((row) => row.group) : []
}

/** Every source named in a draft, each once. */
export const namedSources = (draft: Draft): readonly string[] => {
  if (draft.is === 'quantity') return namedSources(draft.from)
  if (draft.is === 'source') return draft.source.trim() === '' ? [] : [draft.source.trim()]
  return [...new Set(partsOf(draft).flatMap(namedSources))]
}

/** How many values that were typed have no source yet. */
export const withoutSource = (draft: Draft): number => {
  if (draft.is === 'quantity') return draft.text.trim() !== '' && draft.from.kind === '' ? 1 : 0
  return draft.is === 'group' && !draft.on ? 0 : partsOf(draft).reduce((sum, part) => sum + withoutSource(part), 0)
}

const fill = (draft: Draft, kind: ProvenanceKind, source: string): Draft => {
  if (draft.is === 'quantity')
    return draft.text.trim() === '' || draft.from.kind !== ''
      ? draft
      : { ...draft, from: { is: 'source', kind, source } }
  if (draft.is === 'group') return fillSources(draft, kind, source)
  if (draft.is !== 'list') return draft
  return { ...draft, rows: draft.rows.map((row) => ({ ...row, group: fillSources(row.group, kind, source) })) }
}

/** Gives one source to every typed value that has none; the others keep theirs. */
export const fillSources = (draft: GroupDraft, kind: ProvenanceKind, source: string): GroupDraft => ({
  ...draft,
  parts: Object.fromEntries(Object.entries(draft.parts).map(([name, part]) => [name, fill(part, kind, source)])),
})
