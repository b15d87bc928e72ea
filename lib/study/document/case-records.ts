import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

const changeOver = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('time'), at: entered('time') }),
  z.strictObject({ kind: z.literal('speed'), at: entered('speed') }),
])

/** A starting method with its settings; several motors and cases may use the same. */
export const starterRecord = z.discriminatedUnion('kind', [
  z.strictObject({ id: recordId, tag, kind: z.literal('direct'), note }),
  z.strictObject({
    id: recordId,
    tag,
    kind: z.literal('autotransformer'),
    tap: entered('ratio'),
    /** Own impedance in parts of its rating at the motor's rated voltage, line side; null where taken as ideal. */
    own: z
      .strictObject({ impedance: entered('ratio'), rating: entered('apparent-power'), xOverR: entered('ratio') })
      .nullable(),
    changeOver,
    /** Time without voltage; 0 s for a closed transition. */
    gap: entered('time'),
    duty: z.string().max(200).default(''),
    note,
  }),
  z.strictObject({
    id: recordId,
    tag,
    kind: z.literal('star-delta'),
    changeOver,
    gap: entered('time'),
    duty: z.string().max(200).default(''),
    note,
  }),
])

/** What runs before the start, which capacitors are in, where the taps stand. */
export const plantConditionRecord = z.strictObject({
  id: recordId,
  tag,
  running: z.array(z.strictObject({ motor: recordId, curve: recordId })).max(200),
  /** Capacitors in service. */
  capacitors: z.array(recordId).max(100),
  /** Static loads switched off in this condition; all others are on. */
  loadsOff: z.array(recordId).max(200).default([]),
  /** Taps that differ from the transformer's record. */
  taps: z
    .array(z.strictObject({ transformer: recordId, tap: entered('ratio') }))
    .max(100)
    .default([]),
  note,
})

export const scheduleRecord = z.strictObject({
  id: recordId,
  tag,
  starts: z
    .array(z.strictObject({ motor: recordId, at: entered('time'), starter: recordId }))
    .min(1)
    .max(50),
  note,
})

/** Curve of each driven load while its motor starts and once the process is on. */
export const loadConditionRecord = z.strictObject({
  id: recordId,
  tag,
  curves: z.array(z.strictObject({ motor: recordId, starting: recordId, process: recordId.nullable() })).max(200),
  note,
})

/** A departure from the records that makes a sensitivity case; the reason prints. */
export const caseChange = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('voltage-before'), voltage: entered('voltage') }),
  z.strictObject({ kind: z.literal('voltage-factor'), value: entered('ratio') }),
  z.strictObject({ kind: z.literal('transformer-impedance'), transformer: recordId, impedance: entered('ratio') }),
  z.strictObject({ kind: z.literal('motor-admittance'), motor: recordId, factor: entered('ratio') }),
  z.strictObject({ kind: z.literal('motor-torque'), motor: recordId, factor: entered('ratio') }),
  z.strictObject({ kind: z.literal('inertia'), motor: recordId, factor: entered('ratio') }),
])

/** Supply × plant condition × schedule × load condition, with any changes that make it a sensitivity. */
export const caseRecord = z.strictObject({
  id: recordId,
  tag,
  supply: recordId,
  plantCondition: recordId,
  schedule: recordId,
  loadCondition: recordId,
  changes: z.array(caseChange).max(20).default([]),
  /** Why the case is there; required in words for a sensitivity. */
  reason: z.string().max(500).default(''),
  /** A sensitivity is shown beside the others and does not count in the verdict of the whole. */
  role: z.enum(['design', 'sensitivity', 'comparison']),
})

export type StarterRecord = z.infer<typeof starterRecord>
export type PlantConditionRecord = z.infer<typeof plantConditionRecord>
export type ScheduleRecord = z.infer<typeof scheduleRecord>
export type LoadConditionRecord = z.infer<typeof loadConditionRecord>
export type CaseRecord = z.infer<typeof caseRecord>
export type CaseChange = z.infer<typeof caseChange>
