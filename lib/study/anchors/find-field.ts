import type { StudyDocument } from '../document/study-document'
import { isEntered } from '../walk-entered'
import { fieldWords, recordNouns } from '../words/field-words'
import type { Anchor } from './anchor'

const isObject = (value: unknown): value is Record<string, unknown> => typeof value === 'object' && value !== null

/** A step into a value: by name, by identity in a list of things that have one, else by position. */
const step = (value: unknown, name: string): unknown => {
  if (!Array.isArray(value)) return isObject(value) && Object.hasOwn(value, name) ? value[name] : undefined
  return value.find((one) => isObject(one) && one.id === name) ?? value[Number(name)]
}

const print = (value: unknown): string | null => {
  if (isEntered(value)) return value.text
  if (typeof value === 'string' || typeof value === 'number') return String(value)
  if (typeof value === 'boolean') return value ? 'yes' : 'no'
  return null
}

const word = (name: string): string | number => (/^\d+$/.test(name) ? Number(name) : name)

/** A value of a record by identities; null where the record or the value is gone. */
export const findField = (
  { plant, ...study }: StudyDocument,
  { list, id, path }: Extract<Anchor, { kind: 'record' }>,
): { tag: string; words: string; value: string | null } | null => {
  if (!Object.hasOwn(recordNouns, list)) return null
  const records = step(plant, list) ?? step(study, list)
  const record = Array.isArray(records) ? records.find((one) => isObject(one) && one.id === id) : undefined
  if (!isObject(record)) return null
  const value = path.reduce(step, record as unknown)
  if (value === undefined) return null
  return { tag: String(record.tag ?? id), words: fieldWords(path.map(word)), value: path.length ? print(value) : null }
}
