import type { RecordKind } from '@/lib/study/document/record-kinds'

/** Under which members a record of each kind is pointed at, wherever in another record they stand. */
const referenceKeys: Partial<Record<RecordKind, readonly string[]>> = {
  bus: ['bus', 'from', 'to'],
  supply: ['supply', 'supplies'],
  transformer: ['transformer'],
  load: ['loadsOff'],
  capacitor: ['capacitors'],
  motor: ['motor', 'motors'],
  // by the curves that it holds
  'driven-load': ['curve', 'starting', 'process'],
  starter: ['starter'],
  'plant-condition': ['plantCondition', 'plantConditions'],
  'load-condition': ['loadCondition'],
  schedule: ['schedule'],
}

/** Whether a record's values point at one of these identities of another kind of record. */
export function pointsAt(values: unknown, kind: RecordKind, ids: readonly string[]): boolean {
  const keys = referenceKeys[kind] ?? []
  const named = (inner: unknown): boolean => (Array.isArray(inner) ? inner : [inner]).some((one) => ids.includes(one))
  const walk = (value: unknown): boolean => {
    if (Array.isArray(value)) return value.some(walk)
    if (typeof value !== 'object' || value === null) return false
    return Object.entries(value).some(([key, inner]) => (keys.includes(key) && named(inner)) || walk(inner))
  }
  return walk(values)
}

/** The identities by which others point at a record: its own, or those of the curves of a driven load. */
export function pointedAtBy(kind: RecordKind, id: string, values: unknown): string[] {
  if (kind !== 'driven-load') return [id]
  const curves = typeof values === 'object' && values !== null && 'curves' in values ? values.curves : []
  return Array.isArray(curves) ? curves.map((curve: { id: string }) => curve.id) : []
}
