import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

/** What runs before the start, which capacitors are in, where the taps stand. */
export const plantConditionRecord = z.strictObject({
  id: recordId,
  tag,
  running: z
    .array(z.strictObject({ motor: recordId, curve: recordId }))
    .max(200)
    .default([])
    .describe('Motors that run before the start, each with the curve its load follows.'),
  capacitors: z.array(recordId).max(100).default([]).describe('Capacitors in service.'),
  loadsOff: z
    .array(recordId)
    .max(200)
    .default([])
    .describe('Static loads switched off in this condition; all others are on.'),
  taps: z
    .array(z.strictObject({ transformer: recordId, tap: entered('ratio') }))
    .max(100)
    .default([])
    .describe("Taps that differ from the transformer's record."),
  note,
})

/** Curve of each driven load while its motor starts and once the process is on. */
export const loadConditionRecord = z.strictObject({
  id: recordId,
  tag,
  curves: z
    .array(z.strictObject({ motor: recordId, starting: recordId, process: recordId.nullable().default(null) }))
    .max(200)
    .describe(
      'The curve that each driven load follows during the start and, where it changes, once the process is on.',
    ),
  note,
})

/** A departure from the records that makes a sensitivity case; the reason prints. */
export const caseChange = z
  .discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('voltage-before'), voltage: entered('voltage') }),
    z.strictObject({ kind: z.literal('voltage-factor'), value: entered('ratio') }),
    z.strictObject({ kind: z.literal('transformer-impedance'), transformer: recordId, impedance: entered('ratio') }),
    z.strictObject({ kind: z.literal('motor-admittance'), motor: recordId, factor: entered('ratio') }),
    z.strictObject({ kind: z.literal('motor-torque'), motor: recordId, factor: entered('ratio') }),
    z.strictObject({ kind: z.literal('inertia'), motor: recordId, factor: entered('ratio') }),
  ])
  .describe('One departure from the records: a value in its place, or a factor on it.')

/** Supply × plant condition × schedule × load condition, with any changes that make it a sensitivity. */
export const caseRecord = z.strictObject({
  id: recordId,
  tag,
  supply: recordId,
  plantCondition: recordId,
  schedule: recordId,
  loadCondition: recordId,
  changes: z.array(caseChange).max(20).default([]),
  model: z
    .enum(['quasi-static', 'third-order', 'fifth-order'])
    .default('quasi-static')
    .describe(
      'Model of the machines: steady circuits at every slip; rotor fluxes of every machine (third order); or the one directly started machine with its stator too, behind the network as resistance and inductance (fifth order). A machine switched on near synchronous speed is of fifth order in any case.',
    ),
  switchingAngle: entered('number')
    .nullable()
    .default(null)
    .describe(
      'Angle of the voltage of phase a at switching on, in degrees, for the fifth-order model; null: the worst.',
    ),
  reason: z.string().max(500).default('').describe('Why the case is there; required in words for a sensitivity.'),
  role: z
    .enum(['design', 'sensitivity', 'comparison'])
    .describe(
      'Only design cases count in the verdict of the whole; sensitivities and comparisons are shown beside them.',
    ),
})

export type PlantConditionRecord = z.infer<typeof plantConditionRecord>
export type LoadConditionRecord = z.infer<typeof loadConditionRecord>
export type CaseRecord = z.infer<typeof caseRecord>
export type CaseChange = z.infer<typeof caseChange>
