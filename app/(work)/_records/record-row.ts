import type { Outcome } from '@/app/_action/outcome'

/** A live record as the table and the sheet need it, whatever its kind. */
export interface RecordRow {
  id: string
  version: number
  values: Readonly<Record<string, unknown>>
  changedBy: string
  /** ISO 8601. */
  changedAt: string
}

export interface SavedRecord {
  id: string
  version: number
}

/** What the sheet and the table ask of the server; `id` null adds a record. */
export interface RecordActions {
  save: (change: {
    id: string | null
    version: number
    values: Record<string, unknown>
  }) => Promise<Outcome<SavedRecord>>
  remove: (record: SavedRecord) => Promise<Outcome<unknown>>
}
