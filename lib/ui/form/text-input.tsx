'use client'

import { Labelled } from '../labelled'
import type { DraftPath, TextDraft } from './draft'
import type { DateField, DecimalField, TextField, WholeField } from './field'
import { useForm, useIssue } from './form-context'

interface TextInputProps {
  field: TextField | WholeField | DecimalField | DateField
  draft: TextDraft
  path: DraftPath
}

const mayStayEmpty = (field: TextInputProps['field']): string | undefined =>
  field.kind === 'date' || field.optional ? 'may stay empty' : undefined

/** Text, a plain number or a date; a number is read when the record is saved. */
export function TextInput({ field, draft, path }: TextInputProps) {
  const { set } = useForm()
  const error = useIssue(path)
  const change = (text: string) => set(path, { is: 'text', text })
  const lines = field.kind === 'text' ? (field.lines ?? 1) : 1
  return (
    <Labelled label={field.label} hint={field.hint} error={error} aside={lines > 1 ? undefined : mayStayEmpty(field)}>
      {(control) =>
        lines > 1 ? (
          <textarea
            {...control}
            className="control"
            rows={lines}
            value={draft.text}
            onChange={(event) => change(event.target.value)}
          />
        ) : (
          <input
            {...control}
            className="control"
            type={field.kind === 'date' ? 'date' : 'text'}
            inputMode={field.kind === 'whole' ? 'numeric' : field.kind === 'decimal' ? 'decimal' : undefined}
            autoComplete="off"
            value={draft.text}
            onChange={(event) => change(event.target.value)}
          />
        )
      }
    </Labelled>
  )
}
