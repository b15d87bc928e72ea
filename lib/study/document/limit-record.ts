import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

const count = z.number().min(0).max(10_000).nullable().default(null)

/** One rule of the limits sheet. */
export const limitRecord = z.strictObject({
  id: recordId,
  tag: tag.describe('Number on the limits sheet, for example R1.'),
  place: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('bus'), bus: recordId }),
    z.strictObject({ kind: z.literal('every-bus') }),
    z.strictObject({ kind: z.literal('starting-motors') }),
    z.strictObject({ kind: z.literal('running-motors') }),
  ]),
  quantity: z.enum([
    'voltage-change',
    'remaining-voltage',
    'highest-voltage',
    'run-up-time',
    'accelerating-torque',
    'heat-used',
    'flicker-short-term',
    'flicker-long-term',
    'trip-margin',
    'thermal-margin',
  ]),
  instant: z
    .enum(['first', 'deepest', 'settled-after-start', 'settled-after-process'])
    .default('deepest')
    .describe('At which instant a voltage is taken; quantities without an instant leave it out.'),
  reference: z
    .enum(['before', 'nominal', 'rated'])
    .describe('Voltage before the start, nominal voltage of the bus, or rated voltage (torque) of the motor.'),
  limit: z.discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('ratio'), value: entered('ratio') }),
    z.strictObject({ kind: z.literal('time'), value: entered('time') }),
    z.strictObject({
      kind: z.literal('envelope'),
      steps: z
        .array(z.strictObject({ from: entered('time'), value: entered('ratio') }))
        .min(1)
        .max(20),
    }),
  ]),
  appliesTo: z
    .strictObject({
      supplies: z.array(recordId).nullable().default(null),
      plantConditions: z.array(recordId).nullable().default(null),
      methods: z
        .array(
          z.enum([
            'direct',
            'autotransformer',
            'star-delta',
            'reactor',
            'resistor',
            'soft-starter',
            'part-winding',
            'rotor-resistance',
            'captive-transformer',
            'drive',
          ]),
        )
        .nullable()
        .default(null),
      motors: z.array(recordId).nullable().default(null),
    })
    .describe('Which cases, methods and motors the limit is written for; null or left out means all.'),
  startClass: z
    .strictObject({ moreThanPerDay: count, atMostPerDay: count, moreThanPerHour: count, atMostPerHour: count })
    .nullable()
    .default(null)
    .describe('Number of starts that the limit is written for; null where it holds for any.'),
  document: z.string().max(200).default('').describe('Rule, contract or letter that the limit comes from.'),
  clause: z.string().max(80).default(''),
  edition: z.string().max(80).default(''),
  verify: z.boolean().describe('True until somebody has checked the value against the edition in force.'),
  note,
})

export type LimitRecord = z.infer<typeof limitRecord>
