import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

const perUnitBase = z.discriminatedUnion('unit', [
  z
    .strictObject({ unit: z.literal('pu'), base: entered('apparent-power') })
    .describe("Per unit on this power and the motor's rated voltage."),
  z.strictObject({ unit: z.literal('ohm') }),
])

/** Equivalent circuit, star, rotor referred to the stator; plain numbers in the unit of `scale`. */
const circuitValues = {
  scale: perUnitBase,
  stator: z.strictObject({ r: z.number().min(0), x: z.number().positive() }),
  magnetising: z.number().positive().describe('Magnetising reactance.'),
  core: z
    .number()
    .positive()
    .nullable()
    .describe('Core-loss resistance beside the magnetising reactance; null where losses are left out.'),
  provenance: z
    .strictObject({
      kind: z.enum(['test', 'guaranteed', 'typical', 'derived', 'assumed']),
      source: z.string().max(500),
    })
    .nullable(),
}
const cage = z.strictObject({ r: z.number().positive(), x: z.number().min(0) })

export const motorCircuit = z
  .discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('single-cage'), ...circuitValues, cage }),
    z.strictObject({ kind: z.literal('double-cage'), ...circuitValues, inner: cage, outer: cage }),
    z.strictObject({ kind: z.literal('estimated') }),
  ])
  .describe(
    'Star-equivalent circuit, rotor referred to the stator: typed, or estimated from the nameplate each time the study is computed.',
  )

export const motorRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  maker: z.string().max(120).default(''),
  ratedPower: entered('active-power').describe('Power at the shaft.'),
  ratedVoltage: entered('voltage'),
  poles: z
    .int()
    .min(2)
    .max(48)
    .refine((n) => n % 2 === 0, 'The number of poles is even.'),
  ratedSpeed: entered('speed'),
  efficiency: entered('ratio').nullable().default(null).describe('At full load.'),
  powerFactor: entered('ratio').nullable().default(null).describe('At full load.'),
  ratedCurrent: entered('current').nullable().default(null),
  lockedRotorCurrent: entered('current').nullable().default(null).describe('At rated voltage.'),
  lockedRotorTorque: entered('ratio').nullable().default(null).describe('As a multiple of rated torque.'),
  pullUpTorque: entered('ratio')
    .nullable()
    .default(null)
    .describe('Least torque between standstill and breakdown, as a multiple of rated torque; null where not stated.'),
  breakdownTorque: entered('ratio').nullable().default(null).describe('As a multiple of rated torque.'),
  lockedRotorPowerFactor: entered('ratio').nullable().default(null),
  circuit: motorCircuit,
  inertia: entered('inertia').describe('Inertia J of the rotor alone.'),
  permissibleCold: entered('time')
    .nullable()
    .default(null)
    .describe('Permissible locked-rotor time from cold at rated voltage.'),
  permissibleHot: entered('time')
    .nullable()
    .default(null)
    .describe('Permissible locked-rotor time from hot at rated voltage.'),
  startsCold: z.int().min(0).max(20).nullable().default(null).describe('Starts in succession from cold.'),
  startsHot: z.int().min(0).max(20).nullable().default(null).describe('Starts in succession from hot.'),
  startsPerHour: z.int().min(0).max(60).nullable().default(null),
  note,
})

export type MotorRecord = z.infer<typeof motorRecord>
export type MotorCircuit = z.infer<typeof motorCircuit>
