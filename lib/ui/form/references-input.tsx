'use client'

import type { DraftPath, ManyDraft } from './draft'
import type { ReferencesField } from './field'
import { useForm, useIssue } from './form-context'

interface ReferencesInputProps {
  field: ReferencesField
  draft: ManyDraft
  path: DraftPath
}

/** Any number of records, ticked; where "all" is possible it is a tick of its own that hides the rest. */
export function ReferencesInput({ field, draft, path }: ReferencesInputProps) {
  const { set, options } = useForm()
  const error = useIssue(path)
  const offered = field.options ?? options[field.to] ?? []
  const toggle = (value: string, on: boolean) =>
    set(path, { ...draft, values: on ? [...draft.values, value] : draft.values.filter((one) => one !== value) })

  return (
    <fieldset className="m-0 min-w-0 border-0 p-0">
      <legend className="mb-0.5 p-0 text-label font-semibold">{field.label}</legend>
      {field.all === undefined ? null : (
        <label className="mr-4 inline-flex items-center gap-1.5">
          <input
            type="checkbox"
            className="accent-accent"
            checked={draft.all}
            onChange={(event) => set(path, { ...draft, all: event.target.checked })}
          />
          {field.all}
        </label>
      )}
      {draft.all ? null : (
        <div className="flex flex-wrap gap-x-4 gap-y-1">
          {offered.length === 0 ? <span className="text-soft">none recorded yet</span> : null}
          {offered.map((option) => (
            <label key={option.value} className="inline-flex items-center gap-1.5">
              <input
                type="checkbox"
                className="accent-accent"
                checked={draft.values.includes(option.value)}
                onChange={(event) => toggle(option.value, event.target.checked)}
              />
              {option.label}
            </label>
          ))}
        </div>
      )}
      {error || field.hint ? (
        <p className={`m-0 mt-0.5 text-label ${error ? 'text-fails' : 'text-soft'}`}>{error ?? field.hint}</p>
      ) : null}
    </fieldset>
  )
}
