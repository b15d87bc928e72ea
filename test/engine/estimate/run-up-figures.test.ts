import { expect, test } from 'vitest'
import { runUpFigures } from '@/lib/engine/estimate/run-up-figures'
import { atSlip } from '@/lib/engine/machines/at-slip'
import { machineTable } from '@/lib/engine/machines/machine-table'
import { doubleCage } from './circuit-plate'

const circuit = doubleCage([0.0096, 0.11, 2.89, 43, 0.01, 0.198, 0.054, 0.1])
const [time, least, powerFactor] = runUpFigures(machineTable([circuit])).map(Math.exp) as [number, number, number]

test('the time is the mean of one over torque between standstill and a slip of 3 %', () => {
  const count = 20_000
  let sum = 0
  for (let i = 0; i < count; i++) sum += 1 / atSlip(circuit, 0.03 + (0.97 * (i + 0.5)) / count).airgapPerVoltSquared
  expect(Math.abs((time * count) / sum - 1)).toBeLessThan(0.03)
})

test('the least torque is that of the curve within the width of the smooth minimum', () => {
  const torques = Array.from({ length: 971 }, (_, i) => atSlip(circuit, 0.03 + i / 1000).airgapPerVoltSquared)
  const exact = Math.min(...torques)
  expect(least).toBeGreaterThan(exact)
  expect(least).toBeLessThan(1.25 * exact)
})

test('the power factor is that at standstill', () => {
  const { re, im } = atSlip(circuit, 1).admittance
  expect(powerFactor).toBeCloseTo(re / Math.hypot(re, im), 12)
})
