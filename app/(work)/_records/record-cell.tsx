'use client'

import { type KeyboardEvent, useId, useRef, useState } from 'react'
import { parseQuantity } from '@/lib/quantity/parse-quantity'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import type { Draft } from '@/lib/ui/form/draft'
import type { Field, Options } from '@/lib/ui/form/field'
import { showDraft } from '@/lib/ui/form/show-draft'
import { ProvenanceMark } from '@/lib/ui/provenance-mark'
import { moveInTable } from './move-in-table'

interface RecordCellProps {
  field: Field
  draft: Draft
  tag: string
  tags: Options
  style: NumberStyle
  editable: boolean
  /** Returns the sentence to show when the text was refused. */
  onCommit: (draft: Draft) => Promise<string | null>
}

const typedText = (draft: Draft): string | null => (draft.is === 'quantity' || draft.is === 'text' ? draft.text : null)

const canBeTyped = (field: Field): boolean =>
  field.kind === 'quantity' || field.kind === 'text' || field.kind === 'whole' || field.kind === 'decimal'

/** Typing goes on where the click or the Enter key was. */
const focusOnce = (element: HTMLInputElement | null) => element?.focus()

/** A value in the table; pressing Enter or clicking lets it be typed in its place, leaving it saves the record. */
export function RecordCell({ field, draft, tag, tags, style, editable, onCommit }: RecordCellProps) {
  const [typed, setTyped] = useState<string | null>(null)
  const [refusal, setRefusal] = useState<string | null>(null)
  const [busy, setBusy] = useState(false)
  const closed = useRef(false)
  const below = useId()
  const { text, kind, source } = showDraft(field, draft, tags)
  const value = (
    <>
      {field.kind === 'quantity' ? <ProvenanceMark kind={kind} source={source} /> : null}
      {text === '' ? <span className="text-soft">–</span> : null}
      {text.length > 24 ? (
        <span className="inline-block min-w-44">{text}</span>
      ) : (
        <span className="whitespace-nowrap">{text}</span>
      )}
    </>
  )
  if (!editable || !canBeTyped(field)) return value

  const commit = async (text: string) => {
    if (closed.current) return
    if (text === typedText(draft)) return setTyped(null)
    const parsed = field.kind === 'quantity' && text.trim() !== '' ? parseQuantity(text, field.quantity, style) : null
    if (parsed && !parsed.ok) return setRefusal(parsed.message)
    closed.current = true
    setBusy(true)
    const answer = await onCommit(draft.is === 'quantity' ? { ...draft, text, style } : { is: 'text', text })
    closed.current = false
    setBusy(false)
    setRefusal(answer)
    if (answer === null) setTyped(null)
  }

  if (typed === null)
    return (
      <button
        type="button"
        data-cell
        tabIndex={-1}
        title={`Type ${field.label.toLowerCase()} of ${tag}`}
        className="-mx-1 -my-px min-h-5 w-full min-w-6 border border-transparent bg-transparent px-1 py-0 text-inherit [text-align:inherit] hover:border-rule"
        onKeyDown={moveInTable}
        onClick={() => {
          closed.current = false
          setRefusal(null)
          setTyped(typedText(draft) ?? '')
        }}
      >
        {value}
      </button>
    )

  const onKeyDown = (event: KeyboardEvent<HTMLInputElement>) => {
    if (event.key === 'Enter') void commit(event.currentTarget.value)
    if (event.key !== 'Escape') return
    closed.current = true
    setTyped(null)
  }
  return (
    <span className="block min-w-28">
      <input
        ref={focusOnce}
        aria-label={`${field.label} of ${tag}`}
        aria-invalid={refusal ? true : undefined}
        aria-describedby={refusal ? below : undefined}
        className="control min-h-5 px-1 py-0 text-dense"
        disabled={busy}
        value={typed}
        onChange={(event) => {
          setRefusal(null)
          setTyped(event.target.value)
        }}
        onKeyDown={onKeyDown}
        onBlur={(event) => void commit(event.currentTarget.value)}
      />
      {refusal ? (
        <span id={below} role="alert" className="block max-w-60 text-left text-label whitespace-normal text-fails">
          {refusal}
        </span>
      ) : null}
    </span>
  )
}
