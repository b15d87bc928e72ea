import type { Draft, GroupDraft } from '@/lib/ui/form/draft'
import type { Field, Options } from '@/lib/ui/form/field'
import { showDraft } from '@/lib/ui/form/show-draft'

export interface DraftDifference {
  name: string
  label: string
  mine: string
  theirs: string
}

/** The fields that read differently in two versions of a record. */
export const compareDrafts = (
  fields: readonly Field[],
  mine: GroupDraft,
  theirs: GroupDraft,
  tags: Options,
): readonly DraftDifference[] =>
  fields.flatMap((field) => {
    const read = (draft: GroupDraft) => {
      const part = draft.parts[field.name]
      const shown = part && showDraft(field, part, tags)
      return shown ? [shown.text, shown.kind ?? '', shown.source].filter((text) => text !== '').join(' · ') : ''
    }
    const [a, b] = [read(mine), read(theirs)]
    return a === b ? [] : [{ name: field.name, label: field.label, mine: a, theirs: b }]
  })

/** Whether two drafts hold the same text; keys of rows that exist in the browser only do not count. */
export const sameDraft = (a: GroupDraft, b: GroupDraft): boolean => plain(a) === plain(b)

const samePart = (a: Draft | undefined, b: Draft | undefined): boolean => plain(a) === plain(b)

/** My text over a colleague's: what I did not touch is theirs, what I changed stays mine. */
export const mergeDrafts = (base: GroupDraft, mine: GroupDraft, theirs: GroupDraft): GroupDraft => ({
  ...theirs,
  parts: Object.fromEntries(
    Object.entries(theirs.parts).map(([name, part]) => {
      const own = mine.parts[name]
      return [name, own && !samePart(own, base.parts[name]) ? own : part]
    }),
  ),
})

const plain = (draft: Draft | undefined): string =>
  JSON.stringify(draft, (name, value: unknown) => (name === 'key' ? undefined : value))
