import { type Complex, type RadianPerSecond, type Siemens, siemens } from '../../units/si'
import type { MachineModel } from '../case-input'
import { evaluateMachine, machineTable } from './machine-table'

/** What a machine is at one slip, for any voltage: currents are linear in it, power and torque quadratic. */
export interface MachineAtSlip {
  /** Star admittance at the terminals, S per phase. */
  admittance: Complex<Siemens>
  /** Airgap power of the three phases at one volt line to line, W/V². */
  airgapPerVoltSquared: number
}

/**
 * A machine at slip s (1 at standstill, 0 at synchronous speed, negative when driven faster).
 *
 * @param synchronous synchronous speed, rad/s; typed curves need it, but not for the admittance at standstill
 */
export function atSlip(model: MachineModel, slip: number, synchronous = 1): MachineAtSlip {
  const table = machineTable([model], [synchronous])
  evaluateMachine(table, 0, slip)
  return {
    admittance: { re: siemens(table.admittance[0]!), im: siemens(table.admittance[1]!) },
    airgapPerVoltSquared: table.airgap[0]!,
  }
}

/** Airgap torque in N·m at voltage U (V, line to line) of a machine with the given synchronous speed: P_ag/ω_s. */
export const torqueAt = (state: MachineAtSlip, voltage: number, synchronous: RadianPerSecond): number =>
  (state.airgapPerVoltSquared * voltage * voltage) / synchronous
