import type { TextbookMachine } from './at-terminals'
import { noMagnetising, singleCage } from './single-cage'

/**
 * The series circuit that starters are compared with in textbooks: 1 pu current at full-load slip s, n pu at standstill,
 * torque I²·R/s, so that locked-rotor over full-load torque is n²·s. 400 V, 50 Hz, 4 poles, 100 A.
 */
export const statedMotor = (
  lockedRotorCurrent: number,
  slip: number,
): TextbookMachine & { ratedCurrent: number; ratedTorque: number } => {
  const [voltage, frequency, poles, ratedCurrent] = [400, 50, 4, 100]
  const ohm = voltage / Math.sqrt(3) / ratedCurrent
  // R² + X² = 1/n² and (R/s)² + X² = 1, in per unit.
  const resistance = Math.sqrt((1 - lockedRotorCurrent ** -2) / (slip ** -2 - 1))
  const reactance = Math.sqrt(lockedRotorCurrent ** -2 - resistance ** 2)
  const synchronous = (4 * Math.PI * frequency) / poles
  return {
    circuit: singleCage(0, 0, noMagnetising, resistance * ohm, reactance * ohm),
    voltage,
    frequency,
    poles,
    ratedCurrent,
    ratedTorque: (3 * ratedCurrent ** 2 * resistance * ohm) / slip / synchronous,
  }
}
