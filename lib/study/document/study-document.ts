import * as z from 'zod'
import { caseRecord, loadConditionRecord, plantConditionRecord, scheduleRecord, starterRecord } from './case-records'
import { entered } from './entered'
import { limitRecord } from './limit-record'
import { drivenLoadRecord, motorRecord } from './machine-records'
import { busRecord, capacitorRecord, lineRecord, loadRecord, supplyRecord, transformerRecord } from './network-records'

const text = (max: number) => z.string().max(max).default('')

/** Who the study is for and what it is called; the title block prints from here. */
export const studyHead = z.strictObject({
  organisation: z.string().min(1).max(120),
  project: z.string().min(1).max(160),
  client: text(160),
  utility: text(160),
  title: z.string().min(1).max(200),
  documentNumber: z.string().min(1).max(60),
})

/** Text that the engineer writes; the recommendation stays empty until typed. */
export const studyTexts = z.strictObject({
  purpose: text(4000),
  scope: text(4000),
  exclusions: text(4000),
  system: text(4000),
  recommendation: text(4000),
  conclusions: text(4000),
})

/** Settings of the calculation, each with its default stated in the report. */
export const studySettings = z.strictObject({
  /** Part of rated speed at which a motor counts as started. */
  speedCriterion: entered('ratio'),
  timeLimit: entered('time'),
  /** Which permissible locked-rotor time the heat is judged against. */
  thermalState: z.enum(['hot', 'cold']),
  closeOfLimit: entered('ratio'),
  closeVoltage: entered('ratio'),
  startsPerDay: entered('number'),
  startsPerHour: entered('number'),
})

export const plantRecords = z.strictObject({
  buses: z.array(busRecord).max(2000),
  supplies: z.array(supplyRecord).max(50),
  transformers: z.array(transformerRecord).max(2000),
  lines: z.array(lineRecord).max(2000),
  loads: z.array(loadRecord).max(2000),
  capacitors: z.array(capacitorRecord).max(500),
  motors: z.array(motorRecord).max(2000),
  drivenLoads: z.array(drivenLoadRecord).max(2000),
  starters: z.array(starterRecord).max(500),
  plantConditions: z.array(plantConditionRecord).max(200),
  loadConditions: z.array(loadConditionRecord).max(200),
})

/** The one shape: what a file holds, what a revision freezes, what the report is attached to. */
export const studyDocument = z.strictObject({
  format: z.literal('breakaway-study'),
  formatVersion: z.literal(1),
  head: studyHead,
  frequency: entered('frequency'),
  numberStyle: z.enum(['point', 'comma']),
  settings: studySettings,
  texts: studyTexts,
  plant: plantRecords,
  schedules: z.array(scheduleRecord).max(200),
  cases: z.array(caseRecord).max(500),
  limits: z.array(limitRecord).max(200),
})

export type StudyDocument = z.infer<typeof studyDocument>
export type StudyHead = z.infer<typeof studyHead>
export type StudyTexts = z.infer<typeof studyTexts>
export type StudySettings = z.infer<typeof studySettings>
export type PlantRecords = z.infer<typeof plantRecords>
/** As written by hand: plain texts where values are meant. */
export type StudyDocumentInput = z.input<typeof studyDocument>
