import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

const changeOver = z
  .discriminatedUnion('kind', [
    z.strictObject({ kind: z.literal('time'), at: entered('time') }),
    z.strictObject({ kind: z.literal('speed'), at: entered('speed') }),
    z.strictObject({ kind: z.literal('current'), at: entered('current') }).describe('The line current falls to this.'),
    z
      .strictObject({ kind: z.literal('voltage'), at: entered('voltage') })
      .describe("The voltage at the motor's terminals rises to this."),
  ])
  .meta({
    id: 'change-over',
    description: "When the device goes on: a speed, a time from the motor's switching-on, a current or a voltage.",
  })

const ownImpedance = z.strictObject({
  impedance: entered('ratio'),
  rating: entered('apparent-power'),
  xOverR: entered('ratio'),
})

const startCapacitor = z
  .strictObject({
    power: entered('reactive-power').describe('At its rated voltage.'),
    ratedVoltage: entered('voltage'),
    on: changeOver.nullable().default(null).describe('Null: in with the motor.'),
    off: changeOver.nullable().default(null).describe('Null: stays in.'),
  })
  .meta({ id: 'start-capacitor', description: 'Capacitors switched with a start.' })

const dutyLimits = z
  .strictObject({
    secondsPerStart: entered('time').nullable().default(null),
    startsPerHour: z.number().min(0).max(100).nullable().default(null),
  })
  .meta({ id: 'starter-duty', description: 'Longest time of a start outside the running position, starts an hour.' })

/** What every method has. */
const shared = {
  id: recordId,
  tag,
  capacitors: z
    .array(startCapacitor)
    .max(12)
    .default([])
    .describe('Capacitors switched with the start, at the line side of the device.'),
  note,
}

/** What every method with a device has. */
const device = {
  ...shared,
  duty: z.string().max(200).default('').describe('Starts that the maker of the device allows.'),
  dutyLimits: dutyLimits
    .nullable()
    .default(null)
    .describe('The same as figures that the start is checked against; null where the maker is silent.'),
}

/** A starting method with its settings; several motors and cases may use the same. */
export const starterRecord = z.discriminatedUnion('kind', [
  z.strictObject({ kind: z.literal('direct'), ...shared }),
  z.strictObject({
    kind: z.literal('autotransformer'),
    ...device,
    tap: entered('ratio').describe('Voltage of the tap in parts of line voltage, for example 65 %.'),
    own: ownImpedance
      .nullable()
      .default(null)
      .describe(
        "Own impedance in parts of its rating at the motor's rated voltage, line side; null where taken as ideal.",
      ),
    changeOver,
    gap: entered('time').describe('Time without voltage; 0 s for a closed transition.'),
    middle: z
      .strictObject({ reactance: entered('impedance'), time: entered('time') })
      .nullable()
      .default(null)
      .describe(
        'Middle step of a closed transition: reactance a phase of the part of the winding that stays in the line with the star point open, and its length; null: taken as instantaneous.',
      ),
  }),
  z.strictObject({
    kind: z.literal('star-delta'),
    ...device,
    changeOver,
    gap: entered('time'),
    transition: z
      .strictObject({ resistance: entered('impedance'), time: entered('time') })
      .nullable()
      .default(null)
      .describe('Closed transition: resistors in series with the windings in delta for this time; null where none.'),
  }),
  z.strictObject({
    kind: z.literal('reactor'),
    ...device,
    reactance: entered('impedance').describe('A phase.'),
    resistance: entered('impedance').nullable().default(null),
    changeOver,
  }),
  z.strictObject({ kind: z.literal('resistor'), ...device, resistance: entered('impedance'), changeOver }),
  z.strictObject({
    kind: z.literal('soft-starter'),
    ...device,
    ramp: z.discriminatedUnion('kind', [
      z.strictObject({ kind: z.literal('voltage'), from: entered('ratio'), to: entered('ratio') }),
      z
        .strictObject({ kind: z.literal('torque'), from: entered('ratio'), to: entered('ratio') })
        .describe('In parts of rated torque.'),
    ]),
    rampTime: entered('time'),
    kick: z
      .strictObject({ voltage: entered('ratio'), time: entered('time') })
      .nullable()
      .default(null),
    currentLimit: entered('current').nullable().default(null),
    bypass: changeOver.nullable().default(null).describe('Null: running once it conducts fully.'),
  }),
  z.strictObject({
    kind: z.literal('part-winding'),
    ...device,
    currentShare: entered('ratio').describe('Locked-rotor current on part of the winding over that of the whole.'),
    torqueShare: entered('ratio'),
    windingShare: entered('ratio').describe('Part of the winding that is connected first.'),
    changeOver,
  }),
  z.strictObject({
    kind: z.literal('rotor-resistance'),
    ...device,
    steps: z
      .array(
        z.strictObject({
          resistance: entered('impedance').describe('Added to each rotor phase, referred to the stator.'),
          changeOver,
        }),
      )
      .min(1)
      .max(20),
  }),
  z.strictObject({
    kind: z.literal('captive-transformer'),
    ...shared,
    primary: entered('voltage'),
    secondary: entered('voltage').describe('Rated voltage at the motor side.'),
    rating: entered('apparent-power'),
    impedance: entered('ratio'),
    xOverR: entered('ratio'),
  }),
  z.strictObject({
    kind: z.literal('drive'),
    ...device,
    speed: entered('speed').describe('At the end of the ramp.'),
    rampTime: entered('time'),
    motorCurrent: entered('current').describe('Rated current of the motor.'),
    magnetising: entered('ratio').describe('No-load current in parts of the rated current.'),
    efficiency: entered('ratio').describe('Drive and motor together at rated load.'),
    displacementFactor: entered('ratio').describe('Power factor of the fundamental at the line side.'),
    totalFactor: entered('ratio').describe('Power factor of the whole line current with its harmonics.'),
    torqueLimit: entered('ratio').nullable().default(null).describe('In parts of rated torque.'),
    currentLimit: entered('current').nullable().default(null).describe('Of the motor current.'),
    undervoltage: entered('voltage').nullable().default(null).describe('Line voltage below which the drive trips.'),
    bypass: changeOver.nullable().default(null),
  }),
])

export type StarterRecord = z.infer<typeof starterRecord>
export type ChangeOverRecord = z.infer<typeof changeOver>
export type StartCapacitorRecord = z.infer<typeof startCapacitor>
