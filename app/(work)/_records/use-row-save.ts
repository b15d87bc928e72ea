'use client'

import { useRouter } from 'next/navigation'
import { answered } from '@/app/_action/outcome'
import type { NumberStyle } from '@/lib/quantity/quantity-name'
import type { GroupDraft } from '@/lib/ui/form/draft'
import type { Field } from '@/lib/ui/form/field'
import { keepDraft } from '@/lib/ui/form/kept-draft'
import { readDraft } from '@/lib/ui/form/read-draft'
import { recordDraft } from '@/lib/ui/form/to-draft'
import type { RecordActions, RecordRow } from './record-row'

interface RowSave {
  fields: readonly Field[]
  style: NumberStyle
  actions: RecordActions
  keptAs: (id: string) => string
  /** Opens the sheet, where the typed text is found again with everything that there is to say about it. */
  onRefused: (id: string) => void
}

/** Saves a record after one of its cells was typed over; a refusal keeps the text and goes on in the sheet. */
export const useRowSave = ({ fields, style, actions, keptAs, onRefused }: RowSave) => {
  const router = useRouter()
  return async (row: RecordRow, draft: GroupDraft): Promise<string | null> => {
    const read = readDraft(fields, draft, style)
    const refused = read.issues[0]
    if (refused) return refused.message
    const outcome = await answered(() => actions.save({ id: row.id, version: row.version, values: read.values }))
    if (outcome.ok) {
      router.refresh()
      return null
    }
    const base = recordDraft(fields, row.values, style)
    keepDraft(keptAs(row.id), { draft, base, version: row.version, at: Date.now() })
    onRefused(row.id)
    return outcome.message
  }
}
