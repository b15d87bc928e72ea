import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'

const scheduledStart = z.strictObject({
  motor: recordId,
  at: entered('time').describe('Instant of switching on; the earliest one where the start waits for another.'),
  starter: recordId,
  after: z
    .strictObject({ motor: recordId, interval: entered('time') })
    .nullable()
    .default(null)
    .describe(
      'Switched on once that motor has started, at least the interval after its switching-on; null: at its instant.',
    ),
  initialSpeed: entered('speed')
    .nullable()
    .default(null)
    .describe('Speed that the load gives the shaft before the start, negative when it turns backwards; null: at rest.'),
  attempts: z
    .array(z.strictObject({ runFor: entered('time'), rest: entered('time') }))
    .max(10)
    .default([])
    .describe(
      'Attempts before the start that counts: each switched off that long after switching on, whether it has started or not, with a rest before the next.',
    ),
})

const contactor = z.strictObject({
  motor: recordId,
  dropOut: entered('ratio').describe("Voltage below which it drops out, in parts of the motor's rated voltage."),
  delay: entered('time').describe('How long the voltage must be that low.'),
  reclose: z
    .strictObject({ above: entered('ratio'), delay: entered('time') })
    .nullable()
    .default(null)
    .describe('It closes again when the voltage has been above this for that long; null: it stays open.'),
})

/** What happens in a run: starts, and what the supply does. */
export const scheduleRecord = z.strictObject({
  id: recordId,
  tag,
  starts: z.array(scheduledStart).max(50).describe('Which motors start, when, and by which method.'),
  disturbance: z
    .strictObject({
      at: entered('time'),
      duration: entered('time'),
      remaining: entered('ratio'),
      to: z
        .strictObject({
          supply: recordId,
          angle: z
            .number()
            .min(-180)
            .max(180)
            .default(0)
            .describe('By which its voltage leads that of the first, degrees.'),
        })
        .nullable()
        .default(null)
        .describe(
          'Supply at the same bus that the plant comes back on; it waits unloaded at its stated voltage. Null: the first one comes back.',
        ),
      decayTime: entered('time')
        .nullable()
        .default(null)
        .describe('Time in which the residual voltage of the motors decays; a quicker return is not assessed.'),
    })
    .nullable()
    .default(null)
    .describe(
      'Dip of the supply: begin, length, and what remains of its open-circuit voltage; 0 % takes the plant off its supply, as in a transfer.',
    ),
  contactors: z
    .array(contactor)
    .max(200)
    .default([])
    .describe(
      'Contactors of running motors, and of started ones, whose start they end for good; motors without one stay connected whatever the voltage.',
    ),
  note,
})

export type ScheduleRecord = z.infer<typeof scheduleRecord>
