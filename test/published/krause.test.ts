import { describe, expect, test } from 'vitest'
import { atTerminals, breakdown } from './support/at-terminals'
import { startOf } from './support/one-motor-case'
import { singleCage } from './support/single-cage'
import { within } from './support/within'

/*
 * Table of induction machines, all columns from memory; base torque and current recompute from them. Steady figures
 * recomputed with the exact circuit. The table's torque is base torque P/ω_s, not the torque at its speed.
 */
describe('Krause, Wasynczuk, Sudhoff, Analysis of Electric Machinery (table from memory): machines at 60 Hz, 4 poles', () => {
  const machine = (voltage: number, rs: number, x: number, xm: number, rr: number) => ({
    circuit: singleCage(rs, x, xm, rr, x),
    voltage,
    frequency: 60,
    poles: 4,
  })
  const machines = {
    '3 hp': machine(220, 0.435, 0.754, 26.13, 0.816),
    '50 hp': machine(460, 0.087, 0.302, 13.08, 0.228),
    '2250 hp': machine(2300, 0.029, 0.226, 13.04, 0.022),
  }

  test.each([
    ['3 hp', 1710, 8.8448, 0.8148, 14.027],
    ['50 hp', 1705, 62.804, 0.9045, 234.64],
    ['2250 hp', 1786, 469.56, 0.9346, 9173.5],
  ] as const)('%s at %d r/min: %d A, power factor %d, %d N·m', (name, rpm, current, powerFactor, torque) => {
    const at = atTerminals(machines[name], 1 - rpm / 1800)
    within(at.current, current, 1e-4)
    expect(at.powerFactor).toBeCloseTo(powerFactor, 4)
    within(at.torque, torque, 1e-4)
  })

  test.each([
    ['3 hp', 65.739, 0.6237, 52.972],
    ['50 hp', 394.18, 0.4523, 538.5],
    ['2250 hp', 2944.4, 0.1114, 2932.98],
  ] as const)('%s at standstill: %d A, power factor %d, %d N·m', (name, current, powerFactor, torque) => {
    const { lineCurrent, powerFactor: found, torque: produced } = startOf(machines[name]).standstill
    within(lineCurrent, current, 1e-4)
    expect(found).toBeCloseTo(powerFactor, 4)
    within(produced, torque, 1e-4)
  })

  test.each([
    ['3 hp', 0.5268, 61.87],
    ['50 hp', 0.3778, 780.98],
    ['2250 hp', 0.049, 28_417],
  ] as const)('%s breaks down at slip %d with %d N·m', (name, slip, torque) => {
    const found = breakdown(machines[name])
    expect(found.slip).toBeCloseTo(slip, 4)
    within(found.torque, torque, 2e-4)
  })

  test.each([
    ['3 hp', 2238, 11.9],
    ['50 hp', 37_300, 198],
    ['2250 hp', 1_678_500, 8900],
  ] as const)('base torque of %s is rated power over synchronous speed', (_name, watt, torque) => {
    within(watt / ((1800 * Math.PI) / 30), torque, 3e-3)
  })
})
