import type { StudyDocument } from '../document/study-document'
import { type Leaf, leavesOf } from './leaves'

/** A value that is not the same in two revisions. */
export interface InputChange {
  anchor: string
  record: string
  field: string
  /** Null where it was not there. */
  before: string | null
  /** Null where it is no longer there. */
  after: string | null
}

const recordKey = (anchor: string): string => anchor.split('/').slice(0, 2).join('/')

/** Records of which every value is on one side only are one change: the record as a whole. */
const whole = (changes: readonly InputChange[], kept: ReadonlySet<string>): InputChange[] => {
  const seen = new Set<string>()
  return changes.flatMap((change) => {
    const key = recordKey(change.anchor)
    if (kept.has(key) || change.record === 'Study') return [change]
    if (seen.has(key)) return []
    seen.add(key)
    const [before, after] = change.before === null ? [null, 'added'] : ['removed', null]
    return [{ anchor: key, record: change.record, field: 'the record', before, after }]
  })
}

/** What of the inputs, limits, cases and texts is not the same, in the order of the later document; none for a document against itself. */
export const diffInputs = (before: StudyDocument, after: StudyDocument): InputChange[] => {
  const [old, now] = [leavesOf(before), leavesOf(after)]
  const change = (leaf: Leaf, from: string | null, to: string | null): InputChange => {
    const { anchor, record, field } = leaf
    return { anchor, record, field, before: from, after: to }
  }
  const changes = [
    ...[...now.values()].flatMap((leaf) => {
      const from = old.get(leaf.anchor)?.text ?? null
      return from === leaf.text ? [] : [change(leaf, from, leaf.text)]
    }),
    ...[...old.values()].flatMap((leaf) => (now.has(leaf.anchor) ? [] : [change(leaf, leaf.text, null)])),
  ]
  const keysOf = (leaves: ReadonlyMap<string, Leaf>) => new Set([...leaves.keys()].map(recordKey))
  const there = keysOf(now)
  const both = new Set([...keysOf(old)].filter((key) => there.has(key)))
  return whole(changes, both)
}
