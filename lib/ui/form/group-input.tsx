'use client'

import type { ReactNode } from 'react'
import type { DraftPath, GroupDraft } from './draft'
import type { GroupField } from './field'
import { useForm, useIssue } from './form-context'

interface PresenceProps {
  label: string
  absent: string | undefined
  draft: GroupDraft
  path: DraftPath
}

/** The tick that says whether the parts are given; unticked, their text is kept and not stored. */
export function Presence({ label, absent, draft, path }: PresenceProps) {
  const { set } = useForm()
  if (absent === undefined) return null
  return (
    <label className="flex items-center gap-2">
      <input
        type="checkbox"
        className="accent-accent"
        aria-label={`${label} given`}
        checked={draft.on}
        onChange={(event) => set(path, { ...draft, on: event.target.checked })}
      />
      <span className={draft.on ? '' : 'text-soft'}>{draft.on ? 'given' : absent}</span>
    </label>
  )
}

/** Parts that belong together, set off by a line at the left. */
export function Parts({
  label,
  hint,
  path,
  children,
}: {
  label: string
  hint?: string
  path: DraftPath
  children: ReactNode
}) {
  const error = useIssue(path)
  return (
    <fieldset className="m-0 min-w-0 border-0 border-l-2 border-hair p-0 pl-3">
      <legend className="float-left mb-1 w-full p-0 text-label font-semibold">{label}</legend>
      <div className="clear-both flex flex-col gap-2">{children}</div>
      {error || hint ? (
        <p className={`m-0 mt-1 text-label ${error ? 'text-fails' : 'text-soft'}`}>{error ?? hint}</p>
      ) : null}
    </fieldset>
  )
}

export function GroupInput({ field, draft, path }: { field: GroupField; draft: GroupDraft; path: DraftPath }) {
  const { Fields } = useForm()
  const decimals = field.fields.every((part) => part.kind === 'decimal' || part.kind === 'whole')
  return (
    <Parts label={field.label} hint={field.hint} path={path}>
      <Presence label={field.label} absent={field.absent} draft={draft} path={path} />
      {draft.on ? (
        <div className={decimals ? 'grid grid-cols-2 gap-2 @md:grid-cols-3' : 'flex flex-col gap-2'}>
          <Fields fields={field.fields} draft={draft} path={path} />
        </div>
      ) : null}
    </Parts>
  )
}
