import { ohm } from '../../units/si'
import { isTabulated } from '../case-input'
import { breakdownSlip } from '../machines/breakdown-slip'
import type { System } from './system'

/** Breakdown speed of a motor with what is in its rotor circuit now, rad/s. */
export function breakdownSpeedNow(system: System, motor: number): number {
  return (system.supply?.frequency ?? 1) * atRatedFrequency(system, motor)
}

function atRatedFrequency({ plant, connection }: System, motor: number): number {
  if (connection.ownRotor[motor] === 1) return plant.breakdownSpeed[motor]!
  const { circuit } = plant.motors[motor]!
  if (isTabulated(circuit)) return plant.breakdownSpeed[motor]!
  const share = connection.ownRotor[motor]!
  const cages = circuit.cages.map((cage) => ({ ...cage, resistance: ohm(cage.resistance / share) }))
  return plant.synchronous[motor]! * (1 - breakdownSlip({ ...circuit, cages }, plant.synchronous[motor]!))
}
