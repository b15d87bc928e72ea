import { caseRecord, loadConditionRecord, plantConditionRecord } from './case-records'
import { drivenLoadRecord } from './driven-load-record'
import { limitRecord } from './limit-record'
import { motorRecord } from './machine-records'
import { busRecord, capacitorRecord, lineRecord, loadRecord, supplyRecord, transformerRecord } from './network-records'
import { scheduleRecord } from './schedule-record'
import { starterRecord } from './starter-record'

/** Kinds of plant record and the schema of each; a plant is shared by the studies of its project. */
export const plantRecordSchemas = {
  bus: busRecord,
  supply: supplyRecord,
  transformer: transformerRecord,
  line: lineRecord,
  load: loadRecord,
  capacitor: capacitorRecord,
  motor: motorRecord,
  'driven-load': drivenLoadRecord,
  starter: starterRecord,
  'plant-condition': plantConditionRecord,
  'load-condition': loadConditionRecord,
} as const

/** Kinds of record that belong to one study. */
export const studyRecordSchemas = { schedule: scheduleRecord, case: caseRecord, limit: limitRecord } as const

export const recordSchemas = { ...plantRecordSchemas, ...studyRecordSchemas } as const

export type PlantRecordKind = keyof typeof plantRecordSchemas
export type StudyRecordKind = keyof typeof studyRecordSchemas
export type RecordKind = keyof typeof recordSchemas

/** Where the records of each kind stand in the document. */
export const plantCollections = {
  bus: 'buses',
  supply: 'supplies',
  transformer: 'transformers',
  line: 'lines',
  load: 'loads',
  capacitor: 'capacitors',
  motor: 'motors',
  'driven-load': 'drivenLoads',
  starter: 'starters',
  'plant-condition': 'plantConditions',
  'load-condition': 'loadConditions',
} as const satisfies Record<PlantRecordKind, string>
