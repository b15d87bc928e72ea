'use server'

import { attempt } from '@/app/_action/attempt'
import type { SavedRecord } from '@/app/(work)/_records/record-row'
import { perform } from '@/lib/server/perform'
import { addStudyRecord, changeStudyRecord, removeStudyRecord } from '@/lib/server/studies/commands'
import type { StudyRecordKind } from '@/lib/study/document/record-kinds'

interface Place {
  studyId: string
  kind: StudyRecordKind
}

interface Change {
  id: string | null
  version: number
  values: Record<string, unknown>
}

export async function saveStudyRecord(place: Place, { id, version, values }: Change) {
  return attempt(async (actor): Promise<SavedRecord> => {
    const saved =
      id === null
        ? await perform(addStudyRecord, actor, { ...place, values })
        : await perform(changeStudyRecord, actor, { ...place, id, version, values: { ...values, id } })
    return { id: saved.id, version: saved.version }
  })
}

export async function removeStudyRecordAction(place: Place, record: SavedRecord) {
  return attempt((actor) => perform(removeStudyRecord, actor, { ...place, ...record }))
}
