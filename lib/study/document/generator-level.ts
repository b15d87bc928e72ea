import * as z from 'zod'
import { entered } from './entered'

/** A generator in place of the utility, by its data sheet; reactances and gain in parts of its rating at the voltage that the level is stated at. */
export const generatorLevel = z.strictObject({
  form: z.literal('generator'),
  rating: entered('apparent-power').describe(
    'Rated power of the generator; its rated voltage is that the level is stated at.',
  ),
  resistance: entered('ratio').nullable().default(null).describe('Of the armature, in parts of the rating.'),
  synchronous: entered('ratio').describe('X_d, unsaturated, in parts of the rating.'),
  transient: entered('ratio').describe('X′_d.'),
  transientTime: entered('time').describe('T′_d0, with the armature open.'),
  subtransient: z
    .strictObject({ reactance: entered('ratio'), time: entered('time') })
    .nullable()
    .default(null)
    .describe('X″_d and the short-circuit time constant T″_d; null: the first instant is behind X′_d.'),
  quadrature: z
    .strictObject({ reactance: entered('ratio'), time: entered('time') })
    .nullable()
    .default(null)
    .describe('X_q and the open-circuit time constant T″_q0 of its damper; null: no reaction in that axis.'),
  regulator: z
    .strictObject({
      gain: entered('number').describe('Excitation over voltage error, both in parts of rated voltage.'),
      time: entered('time').describe('Time constant of regulator and exciter together.'),
      reset: entered('time')
        .nullable()
        .default(null)
        .describe('Reset time of a regulator that takes up the whole error; null: a lasting error remains.'),
      ceiling: entered('ratio').describe('Largest excitation, in parts of that for rated voltage without load.'),
      fedFromTerminals: z
        .boolean()
        .default(false)
        .describe(
          'The exciter is fed from the terminals, so that its ceiling falls in a dip; false: boosted or independent.',
        ),
    })
    .nullable()
    .default(null)
    .describe('Voltage regulator; null: excitation held as before the start.'),
  inertia: entered('time').describe('H of the whole set: stored energy over rated power, in seconds.'),
  governor: z
    .strictObject({ droop: entered('ratio'), time: entered('time'), power: entered('active-power') })
    .nullable()
    .default(null)
    .describe('Speed governor and the largest power of the prime mover; null: speed held at rated.'),
})

export type GeneratorLevel = z.infer<typeof generatorLevel>
