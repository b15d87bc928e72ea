import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

const curvePoint = z.strictObject({ speed: entered('speed'), torque: entered('torque') })

const breakaway = z
  .strictObject({ torque: entered('torque'), until: entered('speed') })
  .nullable()
  .default(null)
  .describe('Straight line from this torque at standstill to the curve at that speed.')

const named = {
  id: recordId,
  name: z.string().min(1).max(80).describe('The process condition, for example “valve closed”.'),
}

const active = z
  .boolean()
  .default(false)
  .describe('The load may drive the shaft; torques keep their sign, also at speeds below zero.')

/** What both conditions of a pump share: friction at zero speed, torque at rated speed with the valve shut. */
const shutPump = {
  friction: entered('torque').describe('Torque of the closed curve at zero speed.'),
  shut: entered('torque').describe('At rated speed with the valve shut, from the maker’s shut-off power.'),
  ratedSpeed: entered('speed'),
  breakaway,
}

/** Torque against speed under one process condition, at the motor shaft unless the record has a gear. */
export const loadCurve = z
  .discriminatedUnion('kind', [
    z.strictObject({
      ...named,
      kind: z.literal('power'),
      constant: entered('torque').describe('Torque of the curve at zero speed.'),
      atRated: entered('torque').describe('Torque at the rated speed.'),
      ratedSpeed: entered('speed'),
      exponent: entered('number'),
      breakaway,
    }),
    z.strictObject({
      ...named,
      kind: z.literal('points'),
      points: z.array(curvePoint).min(2).max(200).describe('Straight lines between points of rising speed.'),
      active,
    }),
    z
      .strictObject({ ...named, kind: z.literal('pump-closed'), ...shutPump })
      .describe('Pump against a shut valve: friction + (shut − friction)(n/n_r)².'),
    z
      .strictObject({
        ...named,
        kind: z.literal('pump-open'),
        ...shutPump,
        staticHead: entered('length'),
        shutHead: entered('length').describe('Head at rated speed against a shut valve.'),
        points: z.array(curvePoint).min(1).max(50).describe('Above the speed at which the check valve opens, rising.'),
      })
      .describe('Pump against a static head: as if shut up to n_r·√(static head/shut head), then by points.'),
    z
      .strictObject({
        ...named,
        kind: z.literal('constant-power'),
        power: entered('active-power'),
        from: entered('speed').describe('Below this speed the torque is that at this speed.'),
        standstill: entered('torque')
          .nullable()
          .default(null)
          .describe('Torque at standstill, straight to that speed.'),
      })
      .describe('Torque that falls with speed.'),
    z
      .strictObject({
        ...named,
        kind: z.literal('formula'),
        formula: z.string().min(1).max(400).describe('Torque in N·m from n (r/min) or x (n over the rated speed).'),
        ratedSpeed: entered('speed'),
        from: entered('speed').nullable().default(null).describe('Lowest speed it holds for; null: standstill.'),
        upTo: entered('speed').describe('Highest speed it holds for.'),
        active,
      })
      .describe('Typed formula, computed with as points.'),
  ])
  .describe('Torque against speed under one process condition, at the motor shaft unless the record has a gear.')

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
  inertias: z
    .array(
      z.strictObject({ part: z.string().min(1).max(80), inertia: entered('inertia'), speedRatio: entered('ratio') }),
    )
    .max(20)
    .default([])
    .describe('Everything the motor turns, each with its speed as a multiple of motor speed.'),
  inertiaConstants: z
    .array(
      z.strictObject({ part: z.string().min(1).max(80), constant: entered('time'), power: entered('apparent-power') }),
    )
    .max(20)
    .default([])
    .describe('Parts stated by their inertia constant H on a power: energy at rated motor speed is H times the power.'),
  gear: z
    .strictObject({
      speedRatio: entered('ratio').describe('Speed of the load as a multiple of motor speed.'),
      efficiency: entered('ratio').nullable().default(null).describe('Null: without losses.'),
    })
    .nullable()
    .default(null)
    .describe('The curves stand at the shaft of the load behind this gear; null: at the motor shaft.'),
  shaft: z
    .string()
    .max(60)
    .default('')
    .describe('Motors whose loads have the same name here turn one shaft; empty: a shaft of its own.'),
  startsPerHour: z
    .number()
    .min(0)
    .max(100)
    .nullable()
    .default(null)
    .describe('Starts an hour that the process allows.'),
  curves: z.array(loadCurve).min(1).max(20),
  note,
})

export type DrivenLoadRecord = z.infer<typeof drivenLoadRecord>
export type LoadCurveRecord = z.infer<typeof loadCurve>
