import { expect, test } from 'vitest'
import { torquePeaks } from '@/lib/engine/estimate/torque-peaks'
import { atSlip } from '@/lib/engine/machines/at-slip'
import { machineTable } from '@/lib/engine/machines/machine-table'
import { doubleCage } from './circuit-plate'

const peaksOf = (values: readonly number[]) => torquePeaks(machineTable([doubleCage(values)]))

/** Two equal cages of twice the impedance are one cage. */
const singleCage = (rs: number, xs: number, xm: number, r: number, x: number) => [
  rs,
  xs,
  xm,
  1e12,
  2 * r,
  2 * x,
  2 * r,
  2 * x,
]

test('one cage has the one peak of the breakdown formula', () => {
  const [rs, xs, xm, r, x] = [0.02, 0.1, 3, 0.015, 0.12]
  // Thevenin of stator and magnetising branch: V_th = j·x_m/(r_s + j(x_s + x_m)), Z_th = z_s ∥ j·x_m.
  const square = rs ** 2 + (xs + xm) ** 2
  const voltage = xm / Math.sqrt(square)
  const rth = (rs * xm ** 2) / square
  const xth = (xm * (rs ** 2 + xs * (xs + xm))) / square
  const breakdown = voltage ** 2 / (2 * (rth + Math.hypot(rth, xth + x)))
  const peaks = peaksOf(singleCage(rs, xs, xm, r, x))
  expect(peaks).toHaveLength(1)
  expect(peaks[0]! / breakdown).toBeCloseTo(1, 10)
})

test('a high-resistance cage has its peak at standstill', () => {
  const circuit = singleCage(0.01, 0.08, 4, 0.5, 0.08)
  const peaks = peaksOf(circuit)
  expect(peaks).toEqual([atSlip(doubleCage(circuit), 1).airgapPerVoltSquared])
})

test('two cages far apart have a peak each, from low slip to high', () => {
  const peaks = peaksOf([0.05, 0.07, 3, 160, 0.01, 0.26, 0.087, 0.112])
  expect(peaks).toHaveLength(2)
  expect(peaks[0]).toBeLessThan(peaks[1]!)
})
