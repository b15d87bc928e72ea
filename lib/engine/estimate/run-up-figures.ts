import { evaluateMachine, type MachineTable } from '../machines/machine-table'

/** Slips between standstill and full speed at which torque is looked at. */
const slips = Float64Array.from({ length: 14 }, (_, i) => 0.03 + (0.97 * i) / 13)

/** How sharply the mean of powers below picks the least torque. */
const sharpness = 8

/**
 * What circuits on one plate are told apart by, as logarithms: time to accelerate an inertia without load torque (mean of
 * 1/T over the slips), least torque of the run-up as a smooth minimum, and locked-rotor power factor, which sets the dip.
 */
export const runUpFigures = (table: MachineTable): readonly [time: number, least: number, powerFactor: number] => {
  let time = 0
  let least = 0
  for (const slip of slips) {
    evaluateMachine(table, 0, slip)
    const torque = table.airgap[0]!
    time += 1 / torque
    least += torque ** -sharpness
  }
  evaluateMachine(table, 0, 1)
  const [re, im] = [table.admittance[0]!, table.admittance[1]!]
  return [Math.log(time / slips.length), -Math.log(least / slips.length) / sharpness, Math.log(re / Math.hypot(re, im))]
}
