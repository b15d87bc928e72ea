import { Suspense } from 'react'
import { signedIn } from '@/app/_action/signed-in'
import { recordOptions, recordTags } from '@/app/(work)/_records/record-options'
import { RecordWorkspace } from '@/app/(work)/_records/record-workspace'
import type { StudyView } from '@/lib/server/studies/view'
import type { StudyRecordKind } from '@/lib/study/document/record-kinds'
import { removeStudyRecordAction, saveStudyRecord } from './record-actions'

interface StudyRecordsProps {
  study: StudyView
  kind: StudyRecordKind
  /** A sentence for each record, by identity. */
  inWords?: Readonly<Record<string, string>>
}

/** Table and sheet of the study's records of one kind. */
export async function StudyRecords({ study, kind, inWords }: StudyRecordsProps) {
  const { studyId, plant, rows, numberStyle, may } = study
  const actor = await signedIn()
  const place = { studyId, kind }
  return (
    <Suspense>
      <RecordWorkspace
        kind={kind}
        rows={rows[kind]}
        options={recordOptions(plant, rows)}
        tags={recordTags(plant, rows)}
        style={numberStyle}
        editable={may.edit}
        scope={`${actor.userId}/${studyId}`}
        inWords={inWords}
        actions={{ save: saveStudyRecord.bind(null, place), remove: removeStudyRecordAction.bind(null, place) }}
      />
    </Suspense>
  )
}
