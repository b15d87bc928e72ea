'use client'

import { Labelled } from '../labelled'
import type { DraftPath, FlagDraft, TextDraft } from './draft'
import type { ChoiceField, FlagField, Option, ReferenceField } from './field'
import { useForm, useIssue } from './form-context'

interface SelectProps {
  label: string
  hint?: string
  path: DraftPath
  value: string
  options: readonly Option[]
  /** First entry where nothing is chosen; null where something always is. */
  none: string | null
  onChange: (value: string) => void
}

/** A list to choose from; a value that is no longer in it stays visible as it is. */
export function Select({ label, hint, path, value, options, none, onChange }: SelectProps) {
  const error = useIssue(path)
  const known = value === '' || options.some((option) => option.value === value)
  return (
    <Labelled label={label} hint={hint} error={error}>
      {(control) => (
        <select {...control} className="control" value={value} onChange={(event) => onChange(event.target.value)}>
          {none !== null || value === '' ? <option value="">{none ?? 'Choose…'}</option> : null}
          {known ? null : <option value={value}>{value} (not among the records)</option>}
          {options.map((option) => (
            <option key={option.value} value={option.value}>
              {option.label}
            </option>
          ))}
        </select>
      )}
    </Labelled>
  )
}

export function ChoiceInput({ field, draft, path }: { field: ChoiceField; draft: TextDraft; path: DraftPath }) {
  const { set } = useForm()
  return (
    <Select
      label={field.label}
      hint={field.hint}
      path={path}
      value={draft.text}
      options={field.options}
      none={null}
      onChange={(text) => set(path, { is: 'text', text })}
    />
  )
}

interface ReferenceInputProps {
  field: ReferenceField
  draft: TextDraft
  path: DraftPath
  /** Value of the field that narrows the options. */
  narrowedTo: string | undefined
}

export function ReferenceInput({ field, draft, path, narrowedTo }: ReferenceInputProps) {
  const { set, options } = useForm()
  const all = options[field.to] ?? []
  const offered = narrowedTo === undefined ? all : all.filter((option) => option.within === narrowedTo)
  return (
    <Select
      label={field.label}
      hint={field.hint}
      path={path}
      value={draft.text}
      options={offered}
      none={field.optional ? 'none' : null}
      onChange={(text) => set(path, { is: 'text', text })}
    />
  )
}

export function FlagInput({ field, draft, path }: { field: FlagField; draft: FlagDraft; path: DraftPath }) {
  const { set } = useForm()
  return (
    <label className="flex items-start gap-2 text-body">
      <input
        type="checkbox"
        className="mt-1 accent-accent"
        checked={draft.on}
        onChange={(event) => set(path, { is: 'flag', on: event.target.checked })}
      />
      <span>
        {field.label}
        {field.hint ? <span className="block text-label text-soft">{field.hint}</span> : null}
      </span>
    </label>
  )
}
