import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

const count = z.number().min(0).max(10_000).nullable()

/** One rule of the limits sheet. */
export const limitRecord = z.strictObject({
  id: recordId,
  /** Number on the sheet, for example R1. */
  tag,
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
  ]),
  instant: z.enum(['first', 'deepest', 'settled-after-start', 'settled-after-process']),
  reference: z.enum(['before', 'nominal', 'rated']),
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
  /** Null means all. */
  appliesTo: z.strictObject({
    supplies: z.array(recordId).nullable(),
    plantConditions: z.array(recordId).nullable(),
    methods: z.array(z.enum(['direct', 'autotransformer', 'star-delta'])).nullable(),
    motors: z.array(recordId).nullable(),
  }),
  startClass: z
    .strictObject({ moreThanPerDay: count, atMostPerDay: count, moreThanPerHour: count, atMostPerHour: count })
    .nullable(),
  document: z.string().max(200).default(''),
  clause: z.string().max(80).default(''),
  edition: z.string().max(80).default(''),
  /** True until somebody has checked the value against the edition in force. */
  verify: z.boolean(),
  note,
})

export type LimitRecord = z.infer<typeof limitRecord>
