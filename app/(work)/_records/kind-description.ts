import type { RecordKind } from '@/lib/study/document/record-kinds'
import type { Field } from '@/lib/ui/form/field'

export interface TableColumn {
  label: string
  /** Names that lead to the value in the record. */
  path: readonly string[]
}

/** Everything the screens need to know about a kind of record; its values are checked by the schema of the study document. */
export interface KindDescription {
  kind: RecordKind
  /** One record in words, for buttons. */
  one: string
  /** Title of the table. */
  many: string
  /** What an empty table says. */
  empty: string
  fields: readonly Field[]
  /** After the tag. */
  columns: readonly TableColumn[]
  /** Marks of sources are explained below the table. */
  sourced: boolean
}

export const column = (label: string, ...path: string[]): TableColumn => ({ label, path })
