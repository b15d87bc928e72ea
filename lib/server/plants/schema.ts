import * as z from 'zod'
import { type PlantRecordKind, plantRecordSchemas } from '@/lib/study/document/record-kinds'
import { idInput } from '../identity'

const isPlantKind = (key: string): key is PlantRecordKind => Object.hasOwn(plantRecordSchemas, key)

/** Every kind of plant record, in the order of the document. */
export const plantKinds: readonly PlantRecordKind[] = Object.keys(plantRecordSchemas).filter(isPlantKind)

export const plantKind = z.enum(plantKinds)

/** The values of a record as a form sends them; they are validated by the schema of their kind. */
export const recordValues = z.record(z.string(), z.unknown())

export const recordVersion = z.int().min(1)

export const addedPlantRecord = z.object({ projectId: idInput, kind: plantKind, values: recordValues })

export const changedPlantRecord = addedPlantRecord.extend({ id: idInput, version: recordVersion })

export const removedPlantRecord = changedPlantRecord.omit({ values: true })
