import type * as z from 'zod'
import type { PlantRecordKind, RecordKind, recordSchemas, StudyRecordKind } from '@/lib/study/document/record-kinds'

export type RecordValues<Kind extends RecordKind> = z.output<(typeof recordSchemas)[Kind]>

/** A live record as a page shows it. */
export interface Row<Kind extends RecordKind = RecordKind> {
  id: string
  /** Sent back with a change: a change of an older version is refused with both sides. */
  version: number
  values: RecordValues<Kind>
  changedBy: string
  /** ISO 8601, UTC. */
  changedAt: string
}

export type PlantRows = { [Kind in PlantRecordKind]: Row<Kind>[] }
export type StudyRows = { [Kind in StudyRecordKind]: Row<Kind>[] }

/** The detail of a `conflict` on a live record: whose change came first and what it left. */
export interface ConflictDetail<Values = unknown> {
  by: string
  at: string
  version: number
  theirs: Values
}

/** The detail of a refused removal: the records that would point at nothing. */
export interface UsedIn {
  usedIn: { kind: RecordKind; id: string; tag: string }[]
}
