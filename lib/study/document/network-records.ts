import * as z from 'zod'
import { entered } from './entered'
import { generatorLevel } from './generator-level'
import { note, recordId, tag } from './identity'

export const busRecord = z.strictObject({
  id: recordId,
  tag,
  name: z.string().max(120).default('').describe('A longer name, for example “station switchboard”.'),
  nominal: entered('voltage').describe(
    'Nominal line voltage; ratings convert with their own voltage, never with this.',
  ),
  note,
})

const level = z
  .discriminatedUnion('form', [
    z.strictObject({ form: z.literal('power'), power: entered('apparent-power') }),
    z.strictObject({ form: z.literal('current'), current: entered('current') }),
    z.strictObject({ form: z.literal('impedance'), resistance: entered('impedance'), reactance: entered('impedance') }),
    generatorLevel,
  ])
  .describe(
    'Short-circuit level as the utility states it: power, current, or the impedance R + jX; or the generator that supplies the plant instead.',
  )

const voltageFactor = z
  .discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('1.00') }),
    z.strictObject({ kind: z.literal('1.10') }),
    z.strictObject({ kind: z.literal('other'), value: entered('ratio') }),
    z.strictObject({ kind: z.literal('unknown') }),
  ])
  .describe(
    'Voltage factor c that the stated level already contains; unknown is computed as 1.00 and listed as an assumption.',
  )

/** One supply condition: a Thevenin equivalent at a bus under a named state of the utility's network. */
export const supplyRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  meaning: z.string().max(300).default('').describe('State of the network, for example “one source transformer out”.'),
  level,
  statedAt: entered('voltage').describe('Voltage that the level was stated at.'),
  voltageFactor,
  instant: z
    .enum(['initial', 'transient', 'steady', 'unknown'])
    .describe('Which short-circuit value the level is: initial, transient or steady.'),
  plantMotorsIncluded: z
    .enum(['no', 'yes', 'unknown'])
    .describe("Whether the level contains the plant's own motors; where it does they are taken out."),
  xOverR: entered('ratio')
    .nullable()
    .default(null)
    .describe('Required with a power or current level; an impedance carries its own.'),
  before: z
    .discriminatedUnion('kind', [
      z.strictObject({ kind: z.literal('bus-voltage'), voltage: entered('voltage') }),
      z.strictObject({ kind: z.literal('open-circuit'), voltage: entered('voltage') }),
    ])
    .describe(
      'What is held before the start: line voltage at the bus with running load on and starters off, or the open-circuit voltage.',
    ),
  date: z.iso.date().nullable().default(null).describe('Date of the letter, year-month-day.'),
  letter: z.string().max(200).default('').describe('Letter or document that the level came with.'),
  note,
})

export const transformerRecord = z.strictObject({
  id: recordId,
  tag,
  from: recordId,
  to: recordId,
  rating: entered('apparent-power').describe('Rated power that the impedance is given on.'),
  fromVoltage: entered('voltage').describe('Rated voltage of the from side.'),
  toVoltage: entered('voltage').describe('Rated voltage of the to side at no load.'),
  impedance: entered('ratio').describe('Short-circuit impedance in parts of the rating, for example 8 %.'),
  xOverR: entered('ratio'),
  tap: entered('ratio').describe(
    'Tap on the from side as a part of its rated voltage; positive means more turns, so a lower to side.',
  ),
  vectorGroup: z.string().max(20).default(''),
  note,
})

export const lineRecord = z.strictObject({
  id: recordId,
  tag,
  kind: z.enum(['cable', 'overhead']),
  from: recordId,
  to: recordId,
  resistance: entered('impedance-per-length'),
  reactance: entered('impedance-per-length'),
  susceptance: entered('susceptance-per-length').nullable().default(null),
  length: entered('length'),
  parallel: z.int().min(1).max(20).default(1).describe('Equal conductors in parallel; the values are those of one.'),
  note,
})

const mix = z
  .strictObject({
    impedance: z.number().min(0).max(1),
    current: z.number().min(0).max(1),
    power: z.number().min(0).max(1),
  })
  .refine((m) => Math.abs(m.impedance + m.current + m.power - 1) < 1e-9, 'The three parts must add up to 1.')
  .describe('Parts of constant impedance, constant current and constant power; they add up to 1.')

export const loadRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  active: entered('active-power').describe('Power at rated voltage.'),
  reactive: entered('reactive-power').describe('Reactive power at rated voltage, positive where the load takes it.'),
  ratedVoltage: entered('voltage'),
  mix,
  floor: entered('ratio').describe('Below this part of rated voltage the load turns to constant impedance.'),
  note,
})

export const capacitorRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  rating: entered('reactive-power').describe('Reactive power given at rated voltage.'),
  ratedVoltage: entered('voltage'),
  note,
})

export type BusRecord = z.infer<typeof busRecord>
export type SupplyRecord = z.infer<typeof supplyRecord>
export type TransformerRecord = z.infer<typeof transformerRecord>
export type LineRecord = z.infer<typeof lineRecord>
export type LoadRecord = z.infer<typeof loadRecord>
export type CapacitorRecord = z.infer<typeof capacitorRecord>
