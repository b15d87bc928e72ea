import { evaluateMachine, type MachineTable } from '../machines/machine-table'
import { findMinimum } from '../numeric/minimum'

/** Slips searched first: even in the logarithm, because the peak of a large motor lies at a few percent. */
const points = 36
const least = 1e-3
const logarithms = Float64Array.from({ length: points }, (_, i) => Math.log(least) * (1 - i / (points - 1)))
const slips = logarithms.map(Math.exp)
const airgap = new Float64Array(points)

const airgapAt = (table: MachineTable, slip: number): number => {
  evaluateMachine(table, 0, slip)
  return table.airgap[0]!
}

/**
 * Airgap power of the table's first machine at one volt at every peak of its torque-slip curve between slip 0.001 and
 * standstill, from low slip to high. A double cage may have two; standstill counts where torque still rises to it.
 */
export const torquePeaks = (table: MachineTable): readonly number[] => {
  for (let i = 0; i < points; i++) airgap[i] = airgapAt(table, slips[i]!)
  const peaks: number[] = []
  for (let i = 0; i < points; i++) {
    const here = airgap[i]!
    if (i > 0 && here < airgap[i - 1]!) continue
    if (i < points - 1 && here <= airgap[i + 1]!) continue
    peaks.push(i === 0 || i === points - 1 ? here : refine(table, i, here))
  }
  return peaks
}

const refine = (table: MachineTable, at: number, value: number): number => {
  const found = findMinimum(
    (logarithm) => -airgapAt(table, Math.exp(logarithm)),
    logarithms[at - 1]!,
    { at: logarithms[at]!, value: -value },
    logarithms[at + 1]!,
    1e-7,
  )
  return -found.value
}
