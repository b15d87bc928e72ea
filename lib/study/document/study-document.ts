import * as z from 'zod'
import { caseRecord, loadConditionRecord, plantConditionRecord } from './case-records'
import { drivenLoadRecord } from './driven-load-record'
import { entered } from './entered'
import { limitRecord } from './limit-record'
import { motorRecord } from './machine-records'
import { busRecord, capacitorRecord, lineRecord, loadRecord, supplyRecord, transformerRecord } from './network-records'
import { scheduleRecord } from './schedule-record'
import { starterRecord } from './starter-record'

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

/** Parts of the report that an author may leave out; all others always print. */
export const optionalParts = [
  'plots',
  'comparison',
  'commissioning',
  'hand-check',
  'tables',
  'utility-sheet',
  'start-card',
  'glossary',
] as const

/** Chapters that an author may add a text to. */
export const extensibleParts = [
  'criteria',
  'system',
  'input',
  'assumptions',
  'method',
  'cases',
  'results',
  'matrix',
  'plots',
  'comparison',
  'commissioning',
  'cautions',
] as const

const addedText = z.strictObject({
  part: z.enum(extensibleParts),
  text: text(4000).describe('Printed at the end of that chapter; names in braces are filled with values.'),
})

/** Text that the engineer writes, and what else the author decides about the report. */
export const studyTexts = z.strictObject({
  purpose: text(4000),
  scope: text(4000),
  exclusions: text(4000),
  system: text(4000),
  recommendation: text(4000).describe('Stays empty until typed; the tool has none of its own.'),
  conclusions: text(4000),
  paper: z.enum(['A4', 'Letter']).default('A4').describe('Size of the report’s pages.'),
  leftOut: z.array(z.enum(optionalParts)).max(optionalParts.length).default([]).describe('Parts that do not print.'),
  added: z.array(addedText).max(40).default([]).describe('Texts of the author in chapters of the tool.'),
})

/** Settings of the calculation, each with its default stated in the report. */
export const studySettings = z.strictObject({
  speedCriterion: entered('ratio').describe('Part of rated speed at which a motor counts as started, usually 98 %.'),
  timeLimit: entered('time').describe("A start is given up at this time after the motor's switching-on."),
  thermalState: z.enum(['hot', 'cold']).describe('Which permissible locked-rotor time the heat is judged against.'),
  closeOfLimit: entered('ratio').describe(
    'Inside a limit on change, time, torque or heat by less than this part of it reads “close”.',
  ),
  closeVoltage: entered('ratio').describe(
    'Inside a limit on remaining or highest voltage by less than this reads “close”, per unit.',
  ),
  startsPerDay: entered('number').describe('Intended use; decides which class of limits is in use.'),
  startsPerHour: entered('number').describe('Intended use; decides which class of limits is in use.'),
})

export const plantRecords = z.strictObject({
  buses: z.array(busRecord).max(2000).default([]),
  supplies: z.array(supplyRecord).max(50).default([]),
  transformers: z.array(transformerRecord).max(2000).default([]),
  lines: z.array(lineRecord).max(2000).default([]),
  loads: z.array(loadRecord).max(2000).default([]),
  capacitors: z.array(capacitorRecord).max(500).default([]),
  motors: z.array(motorRecord).max(2000).default([]),
  drivenLoads: z.array(drivenLoadRecord).max(2000).default([]),
  starters: z.array(starterRecord).max(500).default([]),
  plantConditions: z.array(plantConditionRecord).max(200).default([]),
  loadConditions: z.array(loadConditionRecord).max(200).default([]),
})

/** The one shape: what a file holds, what a revision freezes, what the report is attached to. */
export const studyDocument = z.strictObject({
  format: z.literal('breakaway-study'),
  formatVersion: z.literal(1).describe('Version of this format; older files are brought up to it when read.'),
  head: studyHead,
  frequency: entered('frequency').describe('System frequency.'),
  numberStyle: z.enum(['point', 'comma']).describe('Which sign marks the decimals in values typed from now on.'),
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
export type OptionalPart = (typeof optionalParts)[number]
export type ExtensiblePart = (typeof extensibleParts)[number]
export type StudySettings = z.infer<typeof studySettings>
export type PlantRecords = z.infer<typeof plantRecords>
/** As written by hand: plain texts where values are meant. */
export type StudyDocumentInput = z.input<typeof studyDocument>
