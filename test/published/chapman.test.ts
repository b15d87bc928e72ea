import { describe, expect, test } from 'vitest'
import { atTerminals, breakdown } from './support/at-terminals'
import { startOf } from './support/one-motor-case'
import { singleCage } from './support/single-cage'
import { within } from './support/within'

/*
 * Data seen in two public exercises; the book's answers from memory. The book's Thevenin short cut (X_th ≈ X₁) moves
 * breakdown and starting torque by up to 3 %; figures of the exact circuit were recomputed.
 */
describe('Chapman, Electric Machinery Fundamentals (answers from memory): 460 V, 25 hp, 60 Hz, 4 poles, star', () => {
  const machine = (r2: number) => ({
    circuit: singleCage(0.641, 1.106, 26.3, r2, 0.464),
    voltage: 460,
    frequency: 60,
    poles: 4,
  })
  const motor = machine(0.332)
  const rotational = 1100

  test('at slip 2.2 %: 18.88 A at −33.6°, power factor 0.833', () => {
    const at = atTerminals(motor, 0.022)
    within(at.current, 18.88, 1e-3)
    expect(at.angle).toBeCloseTo(-33.68, 2)
    within(at.powerFactor, 0.833, 2e-3)
  })

  test('airgap 11 845 W, converted 11 585 W, output 10 485 W, torque 62.8 and 56.9 N·m, efficiency 83.7 %', () => {
    const at = atTerminals(motor, 0.022)
    within(at.airgapPower, 11_845, 1e-3)
    within(at.converted, 11_585, 1e-3)
    within(at.converted - rotational, 10_485, 1e-3)
    within(at.torque, 62.8, 1e-3)
    const speed = 0.978 * 2 * Math.PI * 30
    within((at.converted - rotational) / speed, 56.9, 2e-3)
    within((at.converted - rotational) / at.input, 0.837, 1e-3)
  })

  test('breakdown 229 N·m at slip 0.198 by the short cut, 230.80 N·m at 0.2014 by the exact circuit', () => {
    const { slip, torque } = breakdown(motor)
    within(torque, 229, 0.03)
    within(slip, 0.198, 0.03)
    within(torque, 230.8, 1e-4)
    expect(slip).toBeCloseTo(0.2014, 4)
  })

  test('starting torque 104 N·m by the short cut, 106.56 N·m by the exact circuit', () => {
    const { torque } = startOf(motor).standstill
    within(torque, 104, 0.03)
    within(torque, 106.56, 1e-4)
  })

  test('doubled rotor resistance: the same breakdown torque at twice the slip, starting torque 174.06 N·m', () => {
    const doubled = breakdown(machine(0.664))
    within(doubled.torque, breakdown(motor).torque, 1e-9)
    within(doubled.slip, 2 * breakdown(motor).slip, 1e-6)
    within(startOf(machine(0.664)).standstill.torque, 174.06, 1e-4)
    within(startOf(machine(0.664)).standstill.torque, 170, 0.03)
  })
})
