'use server'

import { attempt } from '@/app/_action/attempt'
import type { SavedRecord } from '@/app/(work)/_records/record-row'
import { perform } from '@/lib/server/perform'
import { addRecord, changeRecord, removeRecord } from '@/lib/server/plants/commands'
import type { PlantRecordKind } from '@/lib/study/document/record-kinds'

interface Place {
  projectId: string
  kind: PlantRecordKind
}

interface Change {
  id: string | null
  version: number
  values: Record<string, unknown>
}

export async function savePlantRecord(place: Place, { id, version, values }: Change) {
  return attempt(async (actor): Promise<SavedRecord> => {
    const saved =
      id === null
        ? await perform(addRecord, actor, { ...place, values })
        : await perform(changeRecord, actor, { ...place, id, version, values: { ...values, id } })
    return { id: saved.id, version: saved.version }
  })
}

export async function removePlantRecord(place: Place, record: SavedRecord) {
  return attempt((actor) => perform(removeRecord, actor, { ...place, ...record }))
}
