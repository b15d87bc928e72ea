import type { Entered, ValueProvenance } from '@/lib/study/document/entered'

/** A value of a record as the report prints it: its text, and where it came from when it is a stated value. */
export interface FieldValue {
  text: string
  /** Undefined for words and references, which need no source; null where the source is missing. */
  provenance?: ValueProvenance | null
}

/** One labelled value of a record; a null value means that the record is silent. */
export interface RecordField<R> {
  label: string
  of: (record: R) => FieldValue | null
  /** Says which record it is rather than what it is like: records that differ in nothing else share a sheet. */
  own?: boolean
}

export const ofEntered = (value: Entered | null): FieldValue | null =>
  value && { text: value.text, provenance: value.provenance }

export const ofWords = (text: string): FieldValue | null => (text.trim() === '' ? null : { text })
