import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

export const busRecord = z.strictObject({
  id: recordId,
  tag,
  name: z.string().max(120).default(''),
  nominal: entered('voltage'),
  note,
})

/** Short-circuit level as the utility states it. */
const level = z.discriminatedUnion('form', [
  z.strictObject({ form: z.literal('power'), power: entered('apparent-power') }),
  z.strictObject({ form: z.literal('current'), current: entered('current') }),
  z.strictObject({ form: z.literal('impedance'), resistance: entered('impedance'), reactance: entered('impedance') }),
])

/** Voltage factor c that the stated level already contains; unknown is computed as 1.00 and listed as an assumption. */
const voltageFactor = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('1.00') }),
  z.strictObject({ kind: z.literal('1.10') }),
  z.strictObject({ kind: z.literal('other'), value: entered('ratio') }),
  z.strictObject({ kind: z.literal('unknown') }),
])

/** One supply condition: a Thevenin equivalent at a bus under a named state of the utility's network. */
export const supplyRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  meaning: z.string().max(300).default(''),
  level,
  /** Voltage that the level was stated at. */
  statedAt: entered('voltage'),
  voltageFactor,
  /** Initial, transient or steady short-circuit value. */
  instant: z.enum(['initial', 'transient', 'steady', 'unknown']),
  plantMotorsIncluded: z.enum(['no', 'yes', 'unknown']),
  /** Required with a power or current level; an impedance carries its own. */
  xOverR: entered('ratio').nullable(),
  /** Line voltage at the bus before the start with running load on and starters off, or the open-circuit voltage. */
  before: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('bus-voltage'), voltage: entered('voltage') }),
    z.strictObject({ kind: z.literal('open-circuit'), voltage: entered('voltage') }),
  ]),
  date: z.iso.date().nullable(),
  letter: z.string().max(200).default(''),
  note,
})

export const transformerRecord = z.strictObject({
  id: recordId,
  tag,
  from: recordId,
  to: recordId,
  rating: entered('apparent-power'),
  fromVoltage: entered('voltage'),
  toVoltage: entered('voltage'),
  impedance: entered('ratio'),
  xOverR: entered('ratio'),
  /** Tap on the from side as a part of its rated voltage; positive means more turns, so a lower to side. */
  tap: entered('ratio'),
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
  susceptance: entered('susceptance-per-length').nullable(),
  length: entered('length'),
  parallel: z.int().min(1).max(20),
  note,
})

/** Parts of constant impedance, current and power; they add up to 1. */
const mix = z
  .strictObject({
    impedance: z.number().min(0).max(1),
    current: z.number().min(0).max(1),
    power: z.number().min(0).max(1),
  })
  .refine((m) => Math.abs(m.impedance + m.current + m.power - 1) < 1e-9, 'The three parts must add up to 1.')

export const loadRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  active: entered('active-power'),
  reactive: entered('reactive-power'),
  ratedVoltage: entered('voltage'),
  mix,
  /** Below this part of rated voltage the load turns to constant impedance. */
  floor: entered('ratio'),
  note,
})

export const capacitorRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  rating: entered('reactive-power'),
  ratedVoltage: entered('voltage'),
  note,
})

export type BusRecord = z.infer<typeof busRecord>
export type SupplyRecord = z.infer<typeof supplyRecord>
export type TransformerRecord = z.infer<typeof transformerRecord>
export type LineRecord = z.infer<typeof lineRecord>
export type LoadRecord = z.infer<typeof loadRecord>
export type CapacitorRecord = z.infer<typeof capacitorRecord>
