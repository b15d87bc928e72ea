import 'server-only'
import type { StudyRecordKind } from '@/lib/study/document/record-kinds'
import type { Tx } from '../db'
import { presentRow } from '../plants/rows'
import type { Row, StudyRows } from '../row'

export async function loadStudyRows(tx: Tx, studyId: string): Promise<StudyRows> {
  const stored = await tx.studyRecord.findMany({ where: { studyId }, orderBy: { position: 'asc' } })
  const of = <Kind extends StudyRecordKind>(kind: Kind): Row<Kind>[] =>
    stored.filter((row) => row.kind === kind).map((row) => presentRow<Kind>(row))
  return { schedule: of('schedule'), case: of('case'), limit: of('limit') }
}
