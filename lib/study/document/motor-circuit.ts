import * as z from 'zod'
import { entered } from './entered'

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

export const curveInterpolation = z
  .enum(['linear', 'monotone'])
  .default('linear')
  .describe('Between points: straight, or a cubic that never turns between them.')

export const torquePoint = z.strictObject({ speed: entered('speed'), torque: entered('torque') })

export const saturationExponents = z.strictObject({
  current: z.number().min(1).max(2).describe('Power of the voltage that the current follows; typical 1.05 to 1.15.'),
  torque: z.number().min(2).max(4).describe('Power of the voltage that the torque follows; typical 2.1 to 2.3.'),
})

export const motorCircuit = z
  .discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('single-cage'), ...circuitValues, cage }),
    z.strictObject({ kind: z.literal('double-cage'), ...circuitValues, inner: cage, outer: cage }),
    z.strictObject({
      kind: z.literal('deep-bar'),
      ...circuitValues,
      cage: cage.describe('At synchronous speed.'),
      locked: cage.describe('At standstill; linear in slip in between.'),
    }),
    z.strictObject({
      kind: z.literal('slot-bar'),
      ...circuitValues,
      cage: cage.describe('At synchronous speed.'),
      depth: z
        .number()
        .min(0)
        .max(20)
        .describe('Height of the bars at standstill in parts of the depth of penetration.'),
      slotShare: z.number().min(0).max(1).describe('Part of the cage reactance that lies in the slot.'),
    }),
    z.strictObject({
      kind: z.literal('table'),
      points: z
        .array(
          z.strictObject({
            speed: entered('speed'),
            torque: entered('torque'),
            current: entered('current'),
            powerFactor: entered('ratio'),
          }),
        )
        .min(3)
        .max(200)
        .describe('At rated voltage, by rising speed from standstill on.'),
      interpolation: curveInterpolation,
    }),
    z.strictObject({ kind: z.literal('estimated') }),
  ])
  .describe(
    'How the motor is computed: star-equivalent circuit with the rotor referred to the stator, typed or estimated from the nameplate each time the study is computed, or curves.',
  )

export type MotorCircuit = z.infer<typeof motorCircuit>
