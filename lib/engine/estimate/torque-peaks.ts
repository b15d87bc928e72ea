import { findMinimum } from '../numeric/minimum'
import { type CircuitVector, stateAtSlip } from './circuit-vector'

/** Slips searched first: even in the logarithm, because the peak of a large motor lies at a few percent. */
const points = 36
const least = 1e-3
const logarithms = Float64Array.from({ length: points }, (_, i) => Math.log(least) * (1 - i / (points - 1)))
const slips = logarithms.map(Math.exp)
const airgap = new Float64Array(points)

/**
 * Airgap power of the circuit at 1 V at every peak of its torque-slip curve between slip 0.001 and standstill, from
 * low slip to high. A double cage may have two; standstill counts where the torque still rises towards it.
 */
export const torquePeaks = (circuit: CircuitVector): readonly number[] => {
  for (let i = 0; i < points; i++) airgap[i] = stateAtSlip(circuit, slips[i]!).airgap
  const peaks: number[] = []
  for (let i = 0; i < points; i++) {
    const here = airgap[i]!
    if (i > 0 && here < airgap[i - 1]!) continue
    if (i < points - 1 && here <= airgap[i + 1]!) continue
    peaks.push(i === 0 || i === points - 1 ? here : refine(circuit, i, here))
  }
  return peaks
}

const refine = (circuit: CircuitVector, at: number, value: number): number => {
  const found = findMinimum(
    (logarithm) => -stateAtSlip(circuit, Math.exp(logarithm)).airgap,
    logarithms[at - 1]!,
    { at: logarithms[at]!, value: -value },
    logarithms[at + 1]!,
    1e-7,
  )
  return -found.value
}
