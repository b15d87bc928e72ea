import type { PlantRecordKind } from '@/lib/study/document/record-kinds'

const busAt = (values: Record<string, unknown>, key: string): string | null => {
  const value = values[key]
  return typeof value === 'string' ? value : null
}

/** The buses that a record stands at, as the columns that the database holds it to. */
export function busesOf(
  kind: PlantRecordKind,
  values: Record<string, unknown>,
): { busId: string | null; toBusId: string | null } {
  if (kind === 'transformer' || kind === 'line') return { busId: busAt(values, 'from'), toBusId: busAt(values, 'to') }
  return { busId: busAt(values, 'bus'), toBusId: null }
}
