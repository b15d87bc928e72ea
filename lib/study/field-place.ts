import type { StudyDocument } from './document/study-document'
import { fieldWords, recordNouns } from './words/field-words'

type Path = readonly (string | number)[]

/** Where a field stands, by identities instead of positions, and as one says it. */
export interface FieldPlace {
  /** `motors/m4/lockedRotorCurrent`: stays when records are sorted, and never uses a tag. */
  anchor: string
  /** `Motor M4`, or `Study` for what belongs to none of the records. */
  record: string
  /** `locked-rotor current` */
  field: string
}

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null

const at = (value: unknown, step: string | number): unknown =>
  Array.isArray(value) ? value[Number(step)] : isObject(value) ? value[step] : undefined

const nameOf = (record: unknown): string | null =>
  isObject(record) ? String(record.tag ?? record.name ?? record.id ?? '') || null : null

/** The place of a path of positions in a document, for example of an issue or an assumption. */
export const fieldPlace = (document: StudyDocument, path: Path): FieldPlace => {
  const anchor: string[] = []
  const inner: (string | number)[] = []
  let record = 'Study'
  let value: unknown = document
  let list = ''
  path.forEach((step) => {
    value = at(value, step)
    const id = isObject(value) && typeof step === 'number' && typeof value.id === 'string' ? value.id : null
    anchor.push(id ?? String(step))
    if (typeof step === 'string' && step in recordNouns && record === 'Study') {
      list = step
      return
    }
    if (list !== '' && record === 'Study') {
      record = `${recordNouns[list]} ${nameOf(value) ?? step}`
      return
    }
    if (record === 'Study' && step === 'plant') return
    inner.push(id === null ? step : (nameOf(value) ?? step))
  })
  return { anchor: anchor.filter((step) => step !== 'plant').join('/'), record, field: fieldWords(inner) }
}
