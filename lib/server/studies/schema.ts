import * as z from 'zod'
import { entered } from '@/lib/study/document/entered'
import { type StudyRecordKind, studyRecordSchemas } from '@/lib/study/document/record-kinds'
import { studyHead, studySettings, studyTexts } from '@/lib/study/document/study-document'
import { idInput } from '../identity'
import { recordValues, recordVersion } from '../plants/schema'

const isStudyKind = (key: string): key is StudyRecordKind => Object.hasOwn(studyRecordSchemas, key)

export const studyKinds: readonly StudyRecordKind[] = Object.keys(studyRecordSchemas).filter(isStudyKind)

export const studyKind = z.enum(studyKinds)

export const createdStudy = z.object({
  projectId: idInput,
  title: studyHead.shape.title,
  documentNumber: studyHead.shape.documentNumber,
  utility: studyHead.shape.utility,
  frequency: entered('frequency'),
  numberStyle: z.enum(['point', 'comma']).default('point'),
})

/** What is left out stays as it is. */
export const changedStudy = z.object({
  studyId: idInput,
  version: recordVersion,
  head: studyHead.optional(),
  settings: studySettings.optional(),
  texts: studyTexts.optional(),
  frequency: entered('frequency').optional(),
  numberStyle: z.enum(['point', 'comma']).optional(),
})

export const addedStudyRecord = z.object({ studyId: idInput, kind: studyKind, values: recordValues })

export const changedStudyRecord = addedStudyRecord.extend({ id: idInput, version: recordVersion })

export const removedStudyRecord = changedStudyRecord.omit({ values: true })
