import * as z from 'zod'

/** Identity of a record, stable over revisions; anchors and references use it, never the tag. */
export const recordId = z
  .string()
  .regex(/^[A-Za-z0-9][A-Za-z0-9_-]{0,63}$/, 'Use letters, digits, - and _ only, at most 64.')
  .meta({ id: 'record-id', description: 'Identity of a record; others refer to it, and it stays over revisions.' })

/** What people call the record on drawings and in tables. */
export const tag = z
  .string()
  .trim()
  .min(1, 'Give the record a tag.')
  .max(60, 'Keep the tag within 60 characters.')
  .meta({ id: 'tag', description: 'What people call the record on drawings and in tables.' })

export const note = z.string().max(2000).default('').meta({ id: 'note', description: 'A remark that prints.' })
