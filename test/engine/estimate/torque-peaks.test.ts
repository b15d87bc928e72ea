import { expect, test } from 'vitest'
import { stateAtSlip } from '@/lib/engine/estimate/circuit-vector'
import { torquePeaks } from '@/lib/engine/estimate/torque-peaks'

/** Two equal cages of twice the impedance are one cage. */
const singleCage = (rs: number, xs: number, xm: number, r: number, x: number) =>
  Float64Array.from([rs, xs, xm, 1e12, 2 * r, 2 * x, 2 * r, 2 * x])

test('one cage has the one peak of the breakdown formula', () => {
  const [rs, xs, xm, r, x] = [0.02, 0.1, 3, 0.015, 0.12]
  // Thevenin of stator and magnetising branch: V_th = j·x_m/(r_s + j(x_s + x_m)), Z_th = z_s ∥ j·x_m.
  const square = rs ** 2 + (xs + xm) ** 2
  const voltage = xm / Math.sqrt(square)
  const rth = (rs * xm ** 2) / square
  const xth = (xm * (rs ** 2 + xs * (xs + xm))) / square
  const breakdown = voltage ** 2 / (2 * (rth + Math.hypot(rth, xth + x)))
  const peaks = torquePeaks(singleCage(rs, xs, xm, r, x))
  expect(peaks).toHaveLength(1)
  expect(peaks[0]! / breakdown).toBeCloseTo(1, 10)
})

test('a high-resistance cage has its peak at standstill', () => {
  const circuit = singleCage(0.01, 0.08, 4, 0.5, 0.08)
  const peaks = torquePeaks(circuit)
  expect(peaks).toEqual([stateAtSlip(circuit, 1).airgap])
})

test('two cages far apart have a peak each, from low slip to high', () => {
  const peaks = torquePeaks(Float64Array.from([0.05, 0.07, 3, 160, 0.01, 0.26, 0.087, 0.112]))
  expect(peaks).toHaveLength(2)
  expect(peaks[0]).toBeLessThan(peaks[1]!)
})

test('the input of the circuit is airgap power, stator loss and core loss at every slip', () => {
  const circuit = Float64Array.from([0.0096, 0.11, 2.89, 43, 0.01, 0.198, 0.054, 0.1])
  for (const slip of [0.001, 0.0081, 0.0367, 0.2, 1]) {
    const { active, reactive, current, airgap } = stateAtSlip(circuit, slip)
    expect(current).toBeCloseTo(Math.hypot(active, reactive), 12)
    // Voltage behind the stator, 1 − z_s·I with I = P − jQ at 1 V.
    const re = 1 - (0.0096 * active + 0.11 * reactive)
    const im = -(0.11 * active - 0.0096 * reactive)
    const loss = 0.0096 * current ** 2 + (re ** 2 + im ** 2) / 43
    expect(active - loss - airgap).toBeCloseTo(0, 12)
  }
})
