import 'server-only'
import type { Tx } from '../db'
import { loadPlantRows } from '../plants/rows'
import { documentOf } from './document-of'
import { loadStudyRows } from './rows'
import { loadStudy } from './study-of'

/** A study in work with all that it is made of, and the document if it is complete. */
export async function loadLiveStudy(tx: Tx, studyId: string) {
  const study = await loadStudy(tx, studyId)
  const plant = await loadPlantRows(tx, study.projectId)
  const records = await loadStudyRows(tx, studyId)
  return { study, plant, records, ...documentOf(study, plant, records) }
}

export type LiveStudy = Awaited<ReturnType<typeof loadLiveStudy>>
