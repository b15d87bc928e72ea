'use client'

import { useRouter } from 'next/navigation'
import { useMemo, useState } from 'react'
import { answered, type Refusal } from '@/app/_action/outcome'
import type { FieldIssue } from '@/lib/errors'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import type { GroupDraft } from '@/lib/ui/form/draft'
import type { Field } from '@/lib/ui/form/field'
import { readDraft } from '@/lib/ui/form/read-draft'
import { recordDraft } from '@/lib/ui/form/to-draft'
import { useKeptDraft } from '@/lib/ui/form/use-kept-draft'
import { mergeDrafts, sameDraft } from './compare-drafts'
import { type Conflict, readConflict } from './conflict'
import type { RecordActions, SavedRecord } from './record-row'

interface SheetInput {
  fields: readonly Field[]
  style: NumberStyle
  /** Under which unsaved text is kept. */
  keptAs: string
  /** Null adds a record. */
  id: string | null
  version: number
  values: unknown
  save: RecordActions['save']
  onSaved: (record: SavedRecord) => void
}

const belowValues = (issue: FieldIssue): FieldIssue =>
  issue.path[0] === 'values' ? { ...issue, path: issue.path.slice(1) } : issue

/** Saving one record: reads the text, shows what was refused, and holds both sides when somebody else came first. */
export const useRecordSheet = ({ fields, style, keptAs, id, version, values, save, onSaved }: SheetInput) => {
  const router = useRouter()
  const saved = useMemo(() => recordDraft(fields, values, style), [fields, values, style])
  const form = useKeptDraft(keptAs, saved, version)
  const [busy, setBusy] = useState(false)
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const [conflict, setConflict] = useState<Conflict | null>(null)

  const theirs = useMemo(() => conflict && recordDraft(fields, conflict.theirs, style), [conflict, fields, style])
  const merged = theirs && mergeDrafts(form.base, form.draft, theirs)

  const send = async (draft: GroupDraft, over: number) => {
    const read = readDraft(fields, draft, style)
    if (read.issues.length > 0) {
      form.refuse(read.issues)
      return setRefusal({
        ok: false,
        code: 'invalid',
        message: 'Not saved yet: correct the marked fields.',
        issues: read.issues,
        detail: null,
      })
    }
    setBusy(true)
    const outcome = await answered(() => save({ id, version: over, values: read.values }))
    setBusy(false)
    setRefusal(outcome.ok ? null : outcome)
    setConflict(outcome.ok ? null : readConflict(outcome.detail))
    if (!outcome.ok) return form.refuse(outcome.issues.map(belowValues))
    form.startFrom(id === null ? saved : draft, outcome.value.version)
    setConflict(null)
    // The address first: changing it would cancel a refresh that is under way.
    onSaved(outcome.value)
    router.refresh()
  }

  return {
    ...form,
    saved,
    busy,
    refusal,
    conflict,
    unsaved: form.touched && !sameDraft(form.draft, saved),
    save: () => send(form.draft, form.version),
    /** Mine over theirs, as it would be saved; null where there is no conflict. */
    merged,
    theirs,
    keepMine: () => conflict && merged && send(merged, conflict.version),
    takeTheirs: () => {
      if (!conflict || !theirs) return
      form.startFrom(theirs, conflict.version)
      setConflict(null)
      setRefusal(null)
      router.refresh()
    },
    discard: () => {
      form.startFrom(saved, version)
      setConflict(null)
      setRefusal(null)
    },
  }
}
