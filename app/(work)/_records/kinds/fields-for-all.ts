import type { Field, ReferenceField, TextField } from '@/lib/ui/form/field'

export const tagField = (hint?: string): TextField => ({ kind: 'text', name: 'tag', label: 'Tag', hint })

export const noteField: Field = { kind: 'text', name: 'note', label: 'Note', lines: 2, optional: true }

export const busField = (name: string, label: string, hint?: string): ReferenceField => ({
  kind: 'reference',
  name,
  label,
  to: 'bus',
  hint,
})

export const motorField = (name = 'motor', label = 'Motor'): ReferenceField => ({
  kind: 'reference',
  name,
  label,
  to: 'motor',
})
