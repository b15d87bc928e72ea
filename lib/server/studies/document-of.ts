import type { FieldIssue } from '@/lib/errors'
import { plantCollections } from '@/lib/study/document/record-kinds'
import type { StudyDocument } from '@/lib/study/document/study-document'
import { readStudyValue } from '@/lib/study/read/read-study'
import { plantKinds } from '../plants/schema'
import type { PlantRows, Row, StudyRows } from '../row'
import type { StudyRow } from './study-of'

const valuesOf = (rows: readonly Row[]): unknown[] => rows.map((row) => row.values)

/** Plant and study put together as one document, or what is still missing or contradictory in it. */
export function documentOf(
  study: Pick<StudyRow, 'head' | 'settings' | 'texts' | 'frequency' | 'numberStyle'>,
  plant: PlantRows,
  records: StudyRows,
): { document: StudyDocument; problems: [] } | { document: null; problems: readonly FieldIssue[] } {
  const { head, settings, texts, frequency, numberStyle } = study
  const read = readStudyValue({
    format: 'breakaway-study',
    formatVersion: 1,
    head,
    frequency,
    numberStyle,
    settings,
    texts,
    plant: Object.fromEntries(plantKinds.map((kind) => [plantCollections[kind], valuesOf(plant[kind])])),
    schedules: valuesOf(records.schedule),
    cases: valuesOf(records.case),
    limits: valuesOf(records.limit),
  })
  return read.ok ? { document: read.value, problems: [] } : { document: null, problems: read.error.issues }
}
