import { randomBytes } from 'node:crypto'
import { DomainError } from '@/lib/errors'
import type { RecordKind } from '@/lib/study/document/record-kinds'
import type { ConflictDetail } from './row'

/** Identity of a new record: its kind and ten random characters. */
export const newRecordId = (kind: RecordKind): string => `${kind}-${randomBytes(6).toString('hex').slice(0, 10)}`

interface Changed {
  version: number
  changedByName: string
  changedAt: Date
  values: unknown
}

/** The refusal of a change that was made on an older version: whose change came first, when, and what it left. */
export function conflictOf({ version, changedByName, changedAt, values }: Changed): DomainError {
  const detail: ConflictDetail = { by: changedByName, at: changedAt.toISOString(), version, theirs: values }
  return new DomainError(
    'conflict',
    `${changedByName} has changed this meanwhile: compare both and choose what to keep.`,
    [],
    detail,
  )
}

export function refuseSameTag(other: { tag: string } | null, tag: string): void {
  if (!other) return
  throw new DomainError('invalid', 'The record cannot be kept as it is: correct the marked fields.', [
    { path: ['values', 'tag'], message: `Another record is called “${tag}” already: choose another tag.` },
  ])
}
