import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

const perUnitBase = z.discriminatedUnion('unit', [
  /** Per unit on the base power and the motor's rated voltage. */
  z.strictObject({ unit: z.literal('pu'), base: entered('apparent-power') }),
  z.strictObject({ unit: z.literal('ohm') }),
])

/** Equivalent circuit, star, rotor referred to the stator; plain numbers in the unit of `scale`. */
const circuitValues = {
  scale: perUnitBase,
  stator: z.strictObject({ r: z.number().min(0), x: z.number().positive() }),
  magnetising: z.number().positive(),
  core: z.number().positive().nullable(),
  provenance: z
    .strictObject({
      kind: z.enum(['test', 'guaranteed', 'typical', 'derived', 'assumed']),
      source: z.string().max(500),
    })
    .nullable(),
}
const cage = z.strictObject({ r: z.number().positive(), x: z.number().min(0) })

/** Typed parameters, or a circuit estimated from the nameplate each time the study is computed. */
export const motorCircuit = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('single-cage'), ...circuitValues, cage }),
  z.strictObject({ kind: z.literal('double-cage'), ...circuitValues, inner: cage, outer: cage }),
  z.strictObject({ kind: z.literal('estimated') }),
])

export const motorRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  maker: z.string().max(120).default(''),
  ratedPower: entered('active-power'),
  ratedVoltage: entered('voltage'),
  poles: z
    .int()
    .min(2)
    .max(48)
    .refine((n) => n % 2 === 0, 'The number of poles is even.'),
  ratedSpeed: entered('speed'),
  efficiency: entered('ratio').nullable(),
  powerFactor: entered('ratio').nullable(),
  ratedCurrent: entered('current').nullable(),
  lockedRotorCurrent: entered('current').nullable(),
  /** Multiples of rated torque. */
  lockedRotorTorque: entered('ratio').nullable(),
  pullUpTorque: entered('ratio').nullable(),
  breakdownTorque: entered('ratio').nullable(),
  lockedRotorPowerFactor: entered('ratio').nullable(),
  circuit: motorCircuit,
  /** Rotor inertia J of the motor alone. */
  inertia: entered('inertia'),
  permissibleCold: entered('time').nullable(),
  permissibleHot: entered('time').nullable(),
  startsCold: z.int().min(0).max(20).nullable(),
  startsHot: z.int().min(0).max(20).nullable(),
  startsPerHour: z.int().min(0).max(60).nullable(),
  note,
})

const curvePoint = z.strictObject({ speed: entered('speed'), torque: entered('torque') })

/** Torque at the motor shaft against motor speed under one process condition. */
export const loadCurve = z.discriminatedUnion('kind', [
  z.strictObject({
    id: recordId,
    name: z.string().min(1).max(80),
    kind: z.literal('power'),
    constant: entered('torque'),
    atRated: entered('torque'),
    ratedSpeed: entered('speed'),
    exponent: entered('number'),
    breakaway: z.strictObject({ torque: entered('torque'), until: entered('speed') }).nullable(),
  }),
  z.strictObject({
    id: recordId,
    name: z.string().min(1).max(80),
    kind: z.literal('points'),
    points: z.array(curvePoint).min(2).max(200),
  }),
])

export const drivenLoadRecord = z.strictObject({
  id: recordId,
  tag,
  motor: recordId,
  machine: z.enum([
    'radial-pump',
    'mixed-flow-pump',
    'axial-pump',
    'positive-displacement-pump',
    'fan',
    'compressor',
    'conveyor',
    'mill',
    'other',
  ]),
  /** Everything the motor turns, each with its speed as a multiple of motor speed. */
  inertias: z
    .array(
      z.strictObject({ part: z.string().min(1).max(80), inertia: entered('inertia'), speedRatio: entered('ratio') }),
    )
    .max(20),
  curves: z.array(loadCurve).min(1).max(20),
  note,
})

export type MotorRecord = z.infer<typeof motorRecord>
export type MotorCircuit = z.infer<typeof motorCircuit>
export type DrivenLoadRecord = z.infer<typeof drivenLoadRecord>
export type LoadCurveRecord = z.infer<typeof loadCurve>
