import type { CaseInput } from '@/lib/engine/case-input'
import { second, siemens } from '@/lib/units/si'

/**
 * A case reduced to what a pocket calculator can follow: one motor started direct-on-line at 0 s, every other machine,
 * static load and capacitor switched off, the open-circuit voltage of the source given. The engine's result for it stands
 * beside the hand calculation in the report. Null where the motor is not started in the case.
 */
export const reducedCase = (input: CaseInput, motorId: string): CaseInput | null => {
  const motor = input.motors.find((one) => one.id === motorId)
  if (motor?.duty.kind !== 'starting') return null
  const { generator: _generator, ...supply } = input.supply
  const { load, processLoad } = motor.duty
  const { shaft: _shaft, ...alone } = motor
  const { disturbance: _disturbance, ...still } = input
  return {
    ...still,
    id: `${input.id}-hand-check`,
    supply: { ...supply, hold: { kind: 'emf', voltage: supply.hold.voltage }, motorsInLevel: [] },
    lines: input.lines.map((line) => ({ ...line, susceptance: siemens(0) })),
    loads: [],
    capacitors: [],
    motors: [{ ...alone, duty: { kind: 'starting', at: second(0), starter: { kind: 'direct' }, load, processLoad } }],
  }
}
