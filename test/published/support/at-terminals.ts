import type { InductionCircuit } from '@/lib/engine/case-input'
import { atSlip, torqueAt } from '@/lib/engine/machines/at-slip'
import { breakdownSlip } from '@/lib/engine/machines/breakdown-slip'
import { hertz } from '@/lib/units/si'
import { synchronousSpeed } from '@/lib/units/speed'

/** A textbook's machine: circuit, line voltage V, frequency Hz, poles. */
export interface TextbookMachine {
  circuit: InductionCircuit
  voltage: number
  frequency: number
  poles: number
}

/** What a textbook tabulates at one slip: A, degrees, W, N·m. */
export const atTerminals = ({ circuit, voltage, frequency, poles }: TextbookMachine, slip: number) => {
  const state = atSlip(circuit, slip)
  const { re, im } = state.admittance
  const size = Math.hypot(re, im)
  const airgapPower = state.airgapPerVoltSquared * voltage ** 2
  return {
    current: (size * voltage) / Math.sqrt(3),
    angle: (Math.atan2(im, re) * 180) / Math.PI,
    powerFactor: re / size,
    input: re * voltage ** 2,
    airgapPower,
    converted: (1 - slip) * airgapPower,
    torque: torqueAt(state, voltage, synchronousSpeed(hertz(frequency), poles)),
    /** Current of a single cage, from 3·I²·R/s = airgap power. */
    rotorCurrent: Math.sqrt((airgapPower * slip) / (3 * (circuit.cages[0]?.resistance ?? Number.NaN))),
  }
}

/** Slip and torque (N·m) of the breakdown point. */
export const breakdown = (machine: TextbookMachine) => {
  const slip = breakdownSlip(machine.circuit)
  return { slip, torque: atTerminals(machine, slip).torque }
}
