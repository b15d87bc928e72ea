import 'server-only'
import type { PlantRecordKind } from '@/lib/study/document/record-kinds'
import type { Tx } from '../db'
import { invalidRecord } from '../record-values'

/** Refuses a record that stands at a bus which is not in the plant, at the field that names it. */
export async function requireBuses(
  tx: Tx,
  projectId: string,
  kind: PlantRecordKind,
  { busId, toBusId }: { busId: string | null; toBusId: string | null },
): Promise<void> {
  const between = kind === 'transformer' || kind === 'line'
  const named = [
    { field: between ? 'from' : 'bus', id: busId },
    { field: 'to', id: toBusId },
  ].filter((bus): bus is { field: string; id: string } => bus.id !== null)
  const ids = named.map(({ id }) => id)
  const present = await tx.plantRecord.findMany({
    where: { projectId, kind: 'bus', id: { in: ids } },
    select: { id: true },
  })
  const missing = named.filter(({ id }) => !present.some((bus) => bus.id === id))
  if (missing.length > 0) {
    throw invalidRecord(
      missing.map(({ field }) => ({
        path: ['values', field],
        message: 'This bus is not in the plant: choose another.',
      })),
    )
  }
}
