import type { FieldIssue } from '@/lib/errors'
import { parseQuantity } from '@/lib/quantity/parse-quantity'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import { readNumber } from '@/lib/quantity/read-number'
import type { Draft, DraftPath, GroupDraft, SourceDraft } from './draft'
import { valuePath } from './draft'
import type { Field, ListField, VariantsField } from './field'

export interface DraftReading {
  values: Record<string, unknown>
  issues: FieldIssue[]
}

const lower = (label: string): string => (/^[A-Z][a-z]/.test(label) ? label[0]?.toLowerCase() + label.slice(1) : label)

const toProvenance = (from: SourceDraft) => (from.kind === '' ? null : { kind: from.kind, source: from.source.trim() })

/** Turns the text of a form into values; what cannot be read is named with the path of its field. */
export const readDraft = (fields: readonly Field[], draft: GroupDraft, style: NumberStyle): DraftReading => {
  const issues: FieldIssue[] = []
  const refuse = (path: DraftPath, message: string): null => {
    issues.push({ path: valuePath(path), message })
    return null
  }

  const number = (field: Field, text: string, path: DraftPath): number | null => {
    const typed = text.trim()
    if (typed === '') {
      const optional = 'optional' in field && field.optional
      return optional ? null : refuse(path, `Type ${lower(field.label)}, a number without a unit.`)
    }
    const read = readNumber(typed.replaceAll('−', '-'), style)
    if (!read.ok || read.rest !== '') return refuse(path, `“${typed}” is not a number; write for example 0.11.`)
    if (field.kind === 'whole' && !Number.isInteger(read.value))
      return refuse(path, 'Write a whole number, for example 4.')
    return read.value
  }

  const readGroup = (parts: readonly Field[], group: GroupDraft, path: DraftPath): Record<string, unknown> => {
    const values: Record<string, unknown> = {}
    for (const field of parts) {
      const part = group.parts[field.name]
      if (!part) continue
      const value = read(field, part, [...path, field.name])
      if (field.name === '') Object.assign(values, value)
      else values[field.name] = value
    }
    return values
  }

  const readVariants = (field: VariantsField, draft: GroupDraft, path: DraftPath) => {
    const chosen = field.options.find((option) => option.value === draft.choice)
    if (!chosen) return refuse([...path, field.tag], `Choose ${lower(field.label)}.`)
    return { [field.tag]: chosen.value, ...readGroup(chosen.fields, draft, path) }
  }

  const readList = (field: ListField, draft: Draft, path: DraftPath) =>
    draft.is !== 'list'
      ? []
      : draft.rows.map((row, index) => ({
          ...(field.identified ? { id: row.key } : {}),
          ...readGroup(field.fields, row.group, [...path, index]),
        }))

  const readText = (field: Field, text: string, path: DraftPath): unknown => {
    const typed = text.trim()
    if (field.kind === 'whole' || field.kind === 'decimal') return number(field, text, path)
    if (field.kind === 'choice') return typed === '' ? refuse(path, `Choose ${lower(field.label)}.`) : typed
    if (field.kind === 'reference') {
      if (typed !== '') return typed
      return field.optional ? null : refuse(path, `Choose ${lower(field.label)}.`)
    }
    if (field.kind === 'date') return typed === '' ? null : typed
    if (field.kind !== 'text' || field.optional)
      return field.kind === 'text' && field.emptyIsNull && typed === '' ? null : typed
    return typed === '' ? refuse(path, `Type ${lower(field.label)}.`) : typed
  }

  const read = (field: Field, draft: Draft, path: DraftPath): unknown => {
    if (draft.is === 'text') return readText(field, draft.text, path)
    if (draft.is === 'flag') return draft.on
    if (draft.is === 'many') return draft.all ? null : draft.values
    if (draft.is === 'source') return toProvenance(draft)
    if (field.kind === 'list') return readList(field, draft, path)
    if (draft.is === 'quantity' && field.kind === 'quantity') {
      const text = draft.text.trim()
      if (text === '' && field.optional) return null
      const parsed = parseQuantity(text, field.quantity, draft.style)
      if (!parsed.ok) return refuse(path, parsed.message)
      return { text, si: parsed.si, quantity: field.quantity, style: draft.style, provenance: toProvenance(draft.from) }
    }
    if (draft.is !== 'group' || !draft.on) return null
    if (field.kind === 'variants') return readVariants(field, draft, path)
    return field.kind === 'group' ? readGroup(field.fields, draft, path) : null
  }

  return { values: readGroup(fields, draft, []), issues }
}
