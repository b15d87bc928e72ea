'use client'

import { type ComponentType, createContext, useContext } from 'react'
import type { FieldIssue } from '@/lib/errors'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import { type Draft, type DraftPath, type GroupDraft, samePath, valuePath } from './draft'
import type { Field, Options } from './field'

/** Some fields of a form, and where they stand in it. */
export interface FieldsProps {
  fields: readonly Field[]
  draft: GroupDraft
  path: DraftPath
  /** In a row: less room around each value. */
  compact?: boolean
}

/** What every field of a form shares. */
export interface FormContextValue {
  options: Options
  style: NumberStyle
  issues: readonly FieldIssue[]
  /** Sources already named, offered while typing another. */
  sources: string
  set: (path: DraftPath, draft: Draft) => void
  /** Draws the fields inside a field; handed down, because each kind of field may hold every other. */
  Fields: ComponentType<FieldsProps>
}

export const FormContext = createContext<FormContextValue | null>(null)

export const useForm = (): FormContextValue => {
  const form = useContext(FormContext)
  if (!form) throw new Error('a field stands outside a form')
  return form
}

/** The refusal that names this field, if there is one. */
export const useIssue = (path: DraftPath): string | undefined => {
  const { issues } = useForm()
  const wanted = valuePath(path)
  return issues.find((issue) => samePath(issue.path, wanted))?.message
}
