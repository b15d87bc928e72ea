import 'server-only'
import type { PlantRecordKind, RecordKind } from '@/lib/study/document/record-kinds'
import type { Tx } from '../db'
import type { PlantRows, RecordValues, Row } from '../row'
import { plantKinds } from './schema'

interface StoredRow {
  id: string
  version: number
  values: unknown
  changedByName: string
  changedAt: Date
}

/** A stored row as a page shows it. Values are written only after validation by their kind's schema. */
export const presentRow = <Kind extends RecordKind>(row: StoredRow): Row<Kind> => ({
  id: row.id,
  version: row.version,
  values: row.values as RecordValues<Kind>,
  changedBy: row.changedByName,
  changedAt: row.changedAt.toISOString(),
})

export async function loadPlantRows(tx: Tx, projectId: string): Promise<PlantRows> {
  const stored = await tx.plantRecord.findMany({ where: { projectId }, orderBy: { position: 'asc' } })
  const of = <Kind extends PlantRecordKind>(kind: Kind): Row<Kind>[] =>
    stored.filter((row) => row.kind === kind).map((row) => presentRow<Kind>(row))
  return Object.fromEntries(plantKinds.map((kind) => [kind, of(kind)])) as PlantRows
}
