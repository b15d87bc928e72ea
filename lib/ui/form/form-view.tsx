'use client'

import { type ReactNode, useId, useMemo } from 'react'
import type { FieldIssue } from '@/lib/errors'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import { type Draft, type DraftPath, type GroupDraft, samePath, valuePath, withDraftAt } from './draft'
import type { Field, Options } from './field'
import { FieldsView } from './fields-view'
import { FormContext } from './form-context'

interface FormViewProps {
  fields: readonly Field[]
  draft: GroupDraft
  style: NumberStyle
  options: Options
  issues: readonly FieldIssue[]
  /** Sources named elsewhere, offered while typing one. */
  knownSources: readonly string[]
  onChange: (draft: GroupDraft, issues: readonly FieldIssue[]) => void
  children?: ReactNode
}

/** The fields of a whole record. A refusal at a field goes away as soon as that field is changed. */
export function FormView({ fields, draft, style, options, issues, knownSources, onChange, children }: FormViewProps) {
  const sources = useId()
  const context = useMemo(
    () => ({
      options,
      style,
      issues,
      sources,
      Fields: FieldsView,
      set: (path: DraftPath, next: Draft) => {
        const changed = valuePath(path)
        const left = issues.filter((issue) => !samePath(issue.path.slice(0, changed.length), changed))
        onChange(withDraftAt(draft, path, next), left)
      },
    }),
    [options, style, issues, sources, draft, onChange],
  )
  return (
    <FormContext value={context}>
      <datalist id={sources}>
        {knownSources.map((source) => (
          <option key={source} value={source} />
        ))}
      </datalist>
      <div className="@container flex flex-col gap-3">
        <FieldsView fields={fields} draft={draft} path={[]} />
        {children}
      </div>
    </FormContext>
  )
}
