import * as z from 'zod'
import { entered } from './entered'
import { note, recordId, tag } from './identity'
import { curveInterpolation, motorCircuit, saturationExponents, torquePoint } from './motor-circuit'
import { motorProtection, thermalLimitPoint } from './motor-protection'

export const motorRecord = z.strictObject({
  id: recordId,
  tag,
  bus: recordId,
  role: z
    .enum(['motor', 'generator'])
    .default('motor')
    .describe(
      'A generator is an induction machine that its driven load drives: an active curve with torques below zero, switched in near synchronous speed.',
    ),
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
  ratedTorque: entered('torque')
    .nullable()
    .default(null)
    .describe('As the plate states it; held against rated power and speed, not computed with.'),
  codeLetter: z
    .string()
    .regex(/^[A-HJ-NPR-V]?$/, 'A code letter is one of A to V without I, O and Q.')
    .default('')
    .describe(
      'Letter of the locked-rotor code; held against the locked-rotor current, not computed with. Empty where not stated.',
    ),
  circuit: motorCircuit,
  torquePoints: z
    .array(torquePoint)
    .max(200)
    .default([])
    .describe(
      'Torque of the motor against speed at rated voltage, from standstill on, in place of the torque of the circuit; empty where the circuit gives it.',
    ),
  torqueInterpolation: curveInterpolation,
  saturation: saturationExponents
    .nullable()
    .default(null)
    .describe('Fall of locked-rotor current and torque with voltage; null for current ∝ U and torque ∝ U².'),
  inertia: entered('inertia').describe('Inertia J of the rotor alone.'),
  permissibleCold: entered('time')
    .nullable()
    .default(null)
    .describe('Permissible locked-rotor time from cold at rated voltage.'),
  permissibleHot: entered('time')
    .nullable()
    .default(null)
    .describe('Permissible locked-rotor time from hot at rated voltage.'),
  thermalLimits: z
    .array(thermalLimitPoint)
    .max(60)
    .default([])
    .describe(
      'Points of the thermal limit curves at currents below that of the locked rotor, hot and cold; empty where the maker gives none.',
    ),
  coolingRunning: entered('time').nullable().default(null).describe('Time constant of cooling while running.'),
  coolingStopped: entered('time').nullable().default(null).describe('Time constant of cooling at standstill.'),
  startsCold: z.int().min(0).max(20).nullable().default(null).describe('Starts in succession from cold.'),
  startsHot: z.int().min(0).max(20).nullable().default(null).describe('Starts in succession from hot.'),
  startsPerHour: z.int().min(0).max(60).nullable().default(null),
  protection: motorProtection.nullable().default(null).describe('Relay of its feeder; null where none is stated.'),
  note,
})

export type MotorRecord = z.infer<typeof motorRecord>
