'use client'

import { useCallback, useEffect, useState } from 'react'
import type { FieldIssue } from '@/lib/errors'
import type { GroupDraft } from './draft'
import { forgetDraft, keepDraft, keptDraft } from './kept-draft'

interface FormState {
  draft: GroupDraft
  /** The record as it was when typing began. */
  base: GroupDraft
  issues: readonly FieldIssue[]
  /** Version that the text was typed over. */
  version: number
  /** When text that was found again had been typed; null where none was found. */
  restoredFrom: number | null
  /** True once typed into and not saved. */
  touched: boolean
  /** False until the browser has looked for kept text: typing before would be lost. */
  ready: boolean
}

/** The state of a form whose unsaved text survives a reload, a closed tab and an ended session. */
export const useKeptDraft = (key: string, saved: GroupDraft, version: number) => {
  const [state, setState] = useState<FormState>({
    draft: saved,
    base: saved,
    issues: [],
    version,
    restoredFrom: null,
    touched: false,
    ready: false,
  })

  useEffect(() => {
    const kept = keptDraft(key)
    setState((now) =>
      kept && !now.ready
        ? {
            ...now,
            draft: kept.draft,
            base: kept.base,
            version: kept.version,
            restoredFrom: kept.at,
            touched: true,
            ready: true,
          }
        : { ...now, ready: true },
    )
  }, [key])

  const change = useCallback(
    (draft: GroupDraft, issues: readonly FieldIssue[]) => {
      setState((now) => {
        keepDraft(key, { draft, base: now.base, version: now.version, at: Date.now() })
        return { ...now, draft, issues, touched: true }
      })
    },
    [key],
  )

  const refuse = useCallback((issues: readonly FieldIssue[]) => setState((now) => ({ ...now, issues })), [])

  /** Goes on from another state of the record: the saved one, or a colleague's. */
  const startFrom = useCallback(
    (draft: GroupDraft, from: number) => {
      forgetDraft(key)
      setState({ draft, base: draft, issues: [], version: from, restoredFrom: null, touched: false, ready: true })
    },
    [key],
  )

  useEffect(() => {
    // Somebody else's change, or one made in the table, reaches a sheet that holds no text of its own.
    if (!state.touched && state.ready && version !== state.version) startFrom(saved, version)
  }, [state.touched, state.ready, state.version, version, saved, startFrom])

  return { ...state, change, refuse, startFrom }
}
