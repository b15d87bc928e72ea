'use client'

import { ChoiceInput, FlagInput, ReferenceInput } from './choice-input'
import type { Draft, DraftPath } from './draft'
import type { Field } from './field'
import { type FieldsProps, useForm } from './form-context'
import { GroupInput } from './group-input'
import { ListInput } from './list-input'
import { QuantityInput } from './quantity-input'
import { ReferencesInput } from './references-input'
import { SourceInput } from './source-input'
import { TextInput } from './text-input'
import { VariantsInput } from './variants-input'

const textOf = (draft: Draft | undefined): string => (draft?.is === 'text' ? draft.text : '')

/** The fields of a record, a group or a row, each by its kind. */
export function FieldsView({ fields, draft, path, compact = false }: FieldsProps) {
  return fields.map((field) => {
    const part = draft.parts[field.name]
    if (!part) return null
    const narrowedTo =
      field.kind === 'reference' && field.within !== undefined ? textOf(draft.parts[field.within]) : undefined
    return (
      <FieldView
        key={field.name}
        field={field}
        draft={part}
        path={[...path, field.name]}
        narrowedTo={narrowedTo}
        compact={compact}
      />
    )
  })
}

interface FieldViewProps {
  field: Field
  draft: Draft
  path: DraftPath
  narrowedTo: string | undefined
  compact: boolean
}

function FieldView({ field, draft, path, narrowedTo, compact }: FieldViewProps) {
  const { set } = useForm()
  if (field.kind === 'quantity' && draft.is === 'quantity')
    return <QuantityInput field={field} draft={draft} path={path} compact={compact} />
  if (field.kind === 'choice' && draft.is === 'text') return <ChoiceInput field={field} draft={draft} path={path} />
  if (field.kind === 'reference' && draft.is === 'text')
    return <ReferenceInput field={field} draft={draft} path={path} narrowedTo={narrowedTo} />
  if (field.kind === 'references' && draft.is === 'many')
    return <ReferencesInput field={field} draft={draft} path={path} />
  if (field.kind === 'flag' && draft.is === 'flag') return <FlagInput field={field} draft={draft} path={path} />
  if (field.kind === 'group' && draft.is === 'group') return <GroupInput field={field} draft={draft} path={path} />
  if (field.kind === 'variants' && draft.is === 'group')
    return <VariantsInput field={field} draft={draft} path={path} />
  if (field.kind === 'list' && draft.is === 'list') return <ListInput field={field} draft={draft} path={path} />
  if (field.kind === 'source' && draft.is === 'source')
    return (
      <div>
        <p className="m-0 mb-0.5 text-label font-semibold">{field.label}</p>
        <SourceInput of={field.label.toLowerCase()} draft={draft} onChange={(next) => set(path, next)} />
      </div>
    )
  const typed = field.kind === 'text' || field.kind === 'whole' || field.kind === 'decimal' || field.kind === 'date'
  return typed && draft.is === 'text' ? <TextInput field={field} draft={draft} path={path} /> : null
}
