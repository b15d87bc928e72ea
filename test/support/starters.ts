import type { MotorInput, Starter } from '@/lib/engine/case-input'
import type { DriveStarter, SoftStarter, StartCapacitor } from '@/lib/engine/starter-input'
import { ampere, ohm, perUnit, second, siemens, volt, watt } from '@/lib/units/si'
import { fromRpm } from '@/lib/units/speed'

/** Starting methods for the motor of the simple plant (200 kW, 400 V, 1480 r/min, 1290 N·m). */

export const reactor = (x: number, rpm: number): Starter => ({
  kind: 'reactor',
  impedance: { re: ohm(0), im: ohm(x) },
  changeOver: { kind: 'speed', at: fromRpm(rpm) },
})

export const softStarter = (changes: Partial<SoftStarter> = {}): SoftStarter => ({
  kind: 'soft-starter',
  ramp: { kind: 'voltage', from: perUnit(0.4), to: perUnit(1) },
  rampTime: second(4),
  kick: null,
  currentLimit: null,
  bypass: null,
  ...changes,
})

export const drive = (changes: Partial<DriveStarter> = {}): DriveStarter => ({
  kind: 'drive',
  speed: fromRpm(1480),
  rampTime: second(10),
  torqueLimit: null,
  currentLimit: ampere(400),
  ratedCurrent: ampere(340),
  magnetising: perUnit(0.35),
  losses: watt(14e3),
  ratedSlip: perUnit(0.0133),
  displacementFactor: perUnit(0.96),
  totalFactor: perUnit(0.93),
  undervoltage: volt(300),
  bypass: null,
  ...changes,
})

export const rotorSteps = (...steps: readonly (readonly [ohms: number, rpm: number])[]): Starter => ({
  kind: 'rotor-resistance',
  steps: steps.map(([ohms, rpm]) => ({ resistance: ohm(ohms), changeOver: { kind: 'speed', at: fromRpm(rpm) } })),
})

export const startCapacitor = (kvar: number, changes: Partial<StartCapacitor> = {}): StartCapacitor => ({
  susceptance: siemens((kvar * 1e3) / 400 ** 2),
  on: null,
  off: { kind: 'speed', at: fromRpm(1450) },
  ...changes,
})

export const withCapacitors = (
  duty: MotorInput['duty'],
  ...capacitors: readonly StartCapacitor[]
): MotorInput['duty'] => (duty.kind === 'starting' ? { ...duty, capacitors } : duty)
