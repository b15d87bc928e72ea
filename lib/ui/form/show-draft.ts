import type { ProvenanceKind } from '@/lib/quantity/provenance'
import type { Draft, DraftPath, GroupDraft } from './draft'
import type { Field, ListField, Option, Options } from './field'

/** A value in one line, as a table or a comparison shows it. */
export interface Shown {
  text: string
  kind: ProvenanceKind | null
  source: string
}

const label = (options: readonly Option[] | undefined, value: string): string =>
  options?.find((option) => option.value === value)?.label ?? value

const plain = (text: string): Shown => ({ text, kind: null, source: '' })

const joined = (fields: readonly Field[], group: GroupDraft, options: Options): string =>
  fields
    .map((field) => {
      const part = group.parts[field.name]
      if (!part) return ''
      const { text } = showDraft(field, part, options)
      return field.inLine === undefined || text === '' ? text : field.inLine.replace('#', text)
    })
    .filter((text) => text !== '')
    .join(' ')

/** A row with an identity goes by its name. */
const rowInLine = (field: ListField, row: GroupDraft, options: Options): string =>
  joined(field.identified ? field.fields.filter(({ name }) => name === 'name') : field.fields, row, options)

/** The draft of a field in words; an identity is shown by its tag, a shape by its name and values. */
export const showDraft = (field: Field, draft: Draft, options: Options): Shown => {
  switch (draft.is) {
    case 'quantity':
      return { text: draft.text, kind: draft.from.kind || null, source: draft.from.source }
    case 'source':
      return { text: draft.source, kind: draft.kind || null, source: draft.source }
    case 'flag':
      return plain(draft.on ? 'yes' : 'no')
    case 'many': {
      if (field.kind !== 'references') return plain('')
      if (draft.all) return plain(field.all ?? '')
      return plain(draft.values.map((value) => label(field.options ?? options[field.to], value)).join(', ') || '–')
    }
    case 'list':
      return plain(
        field.kind === 'list' ? draft.rows.map((row) => rowInLine(field, row.group, options)).join(', ') || '–' : '',
      )
    case 'text': {
      if (field.kind === 'choice') return plain(label(field.options, draft.text))
      return plain(field.kind === 'reference' ? label(options[field.to], draft.text) : draft.text)
    }
    case 'group': {
      if (!draft.on) return plain('absent' in field ? (field.absent ?? '') : '')
      if (field.kind === 'group') return plain(joined(field.fields, draft, options))
      if (field.kind !== 'variants') return plain('')
      const chosen = field.options.find((option) => option.value === draft.choice)
      if (!chosen) return plain('')
      const values = joined(chosen.fields, draft, options)
      return plain(values === '' ? chosen.label : values)
    }
  }
}

/** The field that a path of names leads to; through shapes, the one in use. */
export const fieldAt = (
  fields: readonly Field[],
  draft: GroupDraft,
  path: DraftPath,
): { field: Field; draft: Draft } | null => {
  const [head, ...rest] = path
  const field = fields.find((one) => one.name === head)
  const part = field && draft.parts[field.name]
  if (!field || !part) return null
  if (rest.length === 0) return { field, draft: part }
  if (part.is !== 'group') return null
  if (field.kind === 'group') return fieldAt(field.fields, part, rest)
  // The name of the shape itself.
  if (field.kind === 'variants' && rest.length === 1 && rest[0] === field.tag)
    return {
      field: { kind: 'choice', name: field.tag, label: field.label, options: field.options },
      draft: { is: 'text', text: part.choice },
    }
  const chosen = field.kind === 'variants' ? field.options.find((option) => option.value === part.choice) : undefined
  return chosen ? fieldAt(chosen.fields, part, rest) : null
}

/** The path on to the value of a shape that has only one, as a short-circuit level in MVA has; else the path itself. */
export const onlyValue = (fields: readonly Field[], draft: GroupDraft, path: DraftPath): DraftPath => {
  const found = fieldAt(fields, draft, path)
  if (found?.field.kind !== 'variants' || found.draft.is !== 'group' || !found.draft.on) return path
  const { choice } = found.draft
  const parts = found.field.options.find((option) => option.value === choice)?.fields ?? []
  const [part] = parts
  return parts.length === 1 && part?.kind === 'quantity' ? [...path, part.name] : path
}
