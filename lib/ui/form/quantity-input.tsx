'use client'

import { useState } from 'react'
import { parseQuantity } from '@/lib/quantity/parse-quantity'
import { quantityWording } from '@/lib/quantity/quantity-wording'
import { Labelled } from '../labelled'
import type { DraftPath, QuantityDraft } from './draft'
import type { QuantityField } from './field'
import { useForm, useIssue } from './form-context'
import { SourceInput } from './source-input'

interface QuantityInputProps {
  field: QuantityField
  draft: QuantityDraft
  path: DraftPath
  /** In a list of rows the label is the column's and the source stands below. */
  compact?: boolean
}

const spaced = (text: string): string => text.replace(/\s+/g, ' ').trim()

/** A value as typed; how it was understood is said below once the field is left. */
export function QuantityInput({ field, draft, path, compact = false }: QuantityInputProps) {
  const { set, style } = useForm()
  const refused = useIssue(path)
  const [left, setLeft] = useState(false)
  const empty = draft.text.trim() === ''
  const parsed = empty ? null : parseQuantity(draft.text, field.quantity, draft.style)
  const error = refused ?? (left && parsed && !parsed.ok ? parsed.message : undefined)
  const unclear = parsed?.ok && parsed.ambiguous ? '; check the separator' : ''
  const reading =
    parsed?.ok && (unclear || spaced(parsed.reading) !== spaced(draft.text))
      ? `read as ${parsed.reading}${unclear}`
      : ''
  const aside = field.optional && !compact ? 'may stay empty' : undefined

  return (
    <Labelled label={field.label} error={error} hint={reading || field.hint} aside={aside}>
      {(control) => (
        <div
          className={
            compact
              ? 'flex flex-col gap-1'
              : 'grid grid-cols-1 gap-1 @sm:grid-cols-[minmax(7.5rem,2fr)_minmax(15rem,4fr)]'
          }
        >
          <input
            {...control}
            className="control"
            autoComplete="off"
            placeholder={field.optional ? 'not stated' : quantityWording[field.quantity].example}
            value={draft.text}
            onBlur={() => setLeft(true)}
            onChange={(event) => set(path, { ...draft, text: event.target.value, style })}
          />
          <SourceInput
            of={field.label.toLowerCase()}
            draft={draft.from}
            onChange={(from) => set(path, { ...draft, from })}
          />
        </div>
      )}
    </Labelled>
  )
}
