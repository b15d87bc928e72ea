import * as z from 'zod'
import { entered } from './entered'

const inverse = z.strictObject({
  kind: z.literal('inverse'),
  curve: z
    .enum([
      'normal-inverse',
      'very-inverse',
      'extremely-inverse',
      'short-time-inverse',
      'long-time-inverse',
      'moderately-inverse-us',
      'very-inverse-us',
      'extremely-inverse-us',
    ])
    .describe('Of IEC 60255-151; those that end in “us” of IEEE C37.112.'),
  pickUp: entered('current'),
  multiplier: entered('number').describe('Time multiplier (IEC) or time dial (IEEE).'),
  reset: entered('time')
    .nullable()
    .default(null)
    .describe(
      'Time of the full reset without current; null: the published one of IEEE C37.112, at once for the curves of IEC 60255-151.',
    ),
})

const definite = z
  .strictObject({
    kind: z.literal('definite'),
    name: z.string().max(60).default('').describe('For example locked rotor, instantaneous.'),
    pickUp: entered('current'),
    delay: entered('time'),
  })
  .describe('Operates when the current has been above for the delay.')

const overload = z.strictObject({
  kind: z.literal('overload-class'),
  setting: entered('current'),
  class: z.enum(['5', '10A', '10', '20', '30']).describe('Trip class of IEC 60947-4-1.'),
})

const thermalImage = z
  .strictObject({
    kind: z.literal('thermal-image'),
    base: entered('current').describe('Basic current I_b.'),
    factor: entered('number').describe('k: greatest lasting current over the basic current, usually 1.05 to 1.2.'),
    heating: entered('time').describe('Time constant while the motor runs.'),
    cooling: entered('time').describe('Time constant at standstill.'),
    lastingBefore: entered('current')
      .nullable()
      .default(null)
      .describe('Lasting current before a start from hot; null: rated current of the motor, else the basic current.'),
    inhibit: entered('ratio')
      .nullable()
      .default(null)
      .describe('Heat above which no start is released, in parts of that which trips; null where it does not inhibit.'),
  })
  .describe('Thermal image of IEC 60255-149.')

/** Relay of a motor feeder with its settings. */
export const motorProtection = z.strictObject({
  relay: z.string().max(120).default('').describe('Maker and type.'),
  measures: z
    .enum(['line', 'motor'])
    .default('line')
    .describe('Current that it measures: at the line side of the starting device or at the motor.'),
  currentTransformer: z
    .strictObject({ primary: entered('current'), secondary: entered('current') })
    .nullable()
    .default(null),
  settingsIn: z
    .enum(['primary', 'secondary'])
    .default('primary')
    .describe('Whether the currents of the settings are primary or those behind the current transformer.'),
  elements: z
    .array(z.discriminatedUnion('kind', [inverse, definite, overload, thermalImage]))
    .min(1)
    .max(12),
})

/** A point of a maker's thermal limit curve. */
export const thermalLimitPoint = z.strictObject({
  state: z.enum(['hot', 'cold']),
  current: entered('current'),
  time: entered('time'),
})

export type MotorProtection = z.infer<typeof motorProtection>
export type ProtectionElement = MotorProtection['elements'][number]
