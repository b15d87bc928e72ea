'use client'

import { Select } from './choice-input'
import type { DraftPath, GroupDraft } from './draft'
import type { VariantsField } from './field'
import { useForm } from './form-context'
import { Parts, Presence } from './group-input'

/** One of several shapes: choosing another keeps what was typed into the first. */
export function VariantsInput({ field, draft, path }: { field: VariantsField; draft: GroupDraft; path: DraftPath }) {
  const { set, Fields } = useForm()
  const chosen = field.options.find((option) => option.value === draft.choice)
  const select = (
    <Select
      label={field.label}
      hint={field.hint}
      path={[...path, field.tag]}
      value={draft.choice}
      options={field.options}
      none={null}
      onChange={(choice) => set(path, { ...draft, choice })}
    />
  )
  const parts = chosen && chosen.fields.length > 0 ? <Fields fields={chosen.fields} draft={draft} path={path} /> : null
  if (field.name === '')
    return (
      <>
        {select}
        {parts}
      </>
    )
  return (
    <Parts label={field.label} path={path}>
      <Presence label={field.label} absent={field.absent} draft={draft} path={path} />
      {draft.on ? (
        <>
          <div className="[&_label]:sr-only">{select}</div>
          {parts}
        </>
      ) : null}
    </Parts>
  )
}
