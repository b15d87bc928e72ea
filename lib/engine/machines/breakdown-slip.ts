import type { MachineModel } from '../case-input'
import { findMinimum } from '../numeric/minimum'
import { evaluateMachine, machineTable } from './machine-table'

const points = 400

/**
 * Slip of the first torque maximum below synchronous speed at constant terminal voltage, between 0 and 1.
 *
 * A machine runs steadily on the side of smaller slip only. 1 where torque rises all the way to standstill.
 * A second, higher maximum nearer to standstill (a strong outer cage) does not count.
 *
 * @param synchronous synchronous speed, rad/s; needed for a machine with typed curves
 */
export function breakdownSlip(model: MachineModel, synchronous = Number.NaN): number {
  const table = machineTable([model], [synchronous])
  const negativeTorque = (slip: number): number => {
    evaluateMachine(table, 0, slip)
    return -table.airgap[0]!
  }
  // Logarithmic steps from 1e-4 to 1: breakdown slips lie between half a percent and one.
  const slipAt = (index: number): number => 10 ** (-4 + (4 * index) / points)
  let before = negativeTorque(slipAt(0))
  for (let index = 1; index <= points; index++) {
    const here = negativeTorque(slipAt(index))
    if (here > before) {
      const inside = { at: slipAt(index - 1), value: before }
      return findMinimum(negativeTorque, slipAt(Math.max(0, index - 2)), inside, slipAt(index), 1e-9).at
    }
    before = here
  }
  return 1
}
