import { describe, expect, test } from 'vitest'
import type { Starter } from '@/lib/engine/case-input'
import { ohm, second } from '@/lib/units/si'
import { atTerminals, breakdown } from './support/at-terminals'
import { behind, direct, inStar, onTap, startOf } from './support/one-motor-case'
import { noMagnetising, singleCage } from './support/single-cage'
import { statedMotor } from './support/stated-motor'
import { within } from './support/within'

// Inputs and formulas: public companions to the book; answers recomputed.
describe('Kothari and Nagrath, Electric Machines, example 9.6: 231 V a phase, 50 Hz, 4 poles', () => {
  const motor = {
    circuit: singleCage(0.3, 0.6, 35, 0.25, 0.6),
    voltage: 231 * Math.sqrt(3),
    frequency: 50,
    poles: 4,
  }

  test('start 176.5 A and 143.7 N·m', () => {
    const { lineCurrent, torque } = startOf(motor).standstill
    within(lineCurrent, 176.5, 1e-3)
    within(torque, 143.7, 1e-3)
  })

  test('1450 r/min: 29.95 A, power factor 0.939, airgap torque 118.95 N·m', () => {
    const at = atTerminals(motor, 50 / 1500)
    within(at.current, 29.95, 1e-3)
    expect(at.powerFactor).toBeCloseTo(0.939, 3)
    within(at.torque, 118.95, 1e-4)
  })

  test('breakdown 324.6 N·m at slip 0.2037', () => {
    expect(breakdown(motor).slip).toBeCloseTo(0.2037, 4)
    within(breakdown(motor).torque, 324.6, 2e-4)
  })
})

describe('Kothari and Nagrath, Electric Machines, example 9.12: ways of starting compared', () => {
  // Locked-rotor current 6 pu, full load at slip 0.05.
  const motor = statedMotor(6, 0.05)

  test('direct: 6 pu current, 1.8 pu torque', () => {
    const { lineCurrent, torque } = startOf({ ...motor, starter: direct }).standstill
    within(lineCurrent / motor.ratedCurrent, 6, 1e-6)
    within(torque / motor.ratedTorque, 1.8, 1e-6)
  })

  test('autotransformer that gives the motor 2 pu: 0.667 pu in the line, 0.2 pu torque', () => {
    // The companion's 0.0222 takes the line current in place of the motor current.
    const { lineCurrent, motorCurrent, torque } = startOf({ ...motor, starter: onTap(1 / 3) }).standstill
    within(motorCurrent / motor.ratedCurrent, 2, 1e-6)
    within(lineCurrent / motor.ratedCurrent, 0.6667, 1e-4)
    within(torque / motor.ratedTorque, 0.2, 1e-6)
  })

  test('stator resistance that holds the current at 2 pu: 0.2 pu torque', () => {
    const { resistance, reactance } = motor.circuit.cages[0]!
    const size = motor.voltage / Math.sqrt(3) / (2 * motor.ratedCurrent)
    const added = Math.sqrt(size ** 2 - reactance ** 2) - resistance
    const { lineCurrent, torque } = startOf({ ...motor, starter: behind('resistor', added) }).standstill
    within(lineCurrent / motor.ratedCurrent, 2, 1e-6)
    within(torque / motor.ratedTorque, 0.2, 1e-6)
  })

  test('star-delta: 2 pu current, 0.6 pu torque', () => {
    const { lineCurrent, torque } = startOf({ ...motor, starter: inStar }).standstill
    within(lineCurrent / motor.ratedCurrent, 2, 1e-6)
    within(torque / motor.ratedTorque, 0.6, 1e-6)
  })

  test('a tap of 0.7454 starts with full-load torque', () => {
    within(startOf({ ...motor, starter: onTap(0.7454) }).standstill.torque / motor.ratedTorque, 1, 1e-3)
  })
})

const cageTorque = (r: number, x: number, slip: number): number => {
  const cage = { circuit: singleCage(0, 0, noMagnetising, r, x), voltage: 1, frequency: 50, poles: 4 }
  return atTerminals(cage, slip).torque
}

describe('Kothari and Nagrath, Electric Machines, example 9.18: torques of two cages, stator left out', () => {
  const ratio = (slip: number) => cageTorque(0.05, 0.1, slip) / cageTorque(0.01, 0.5, slip)

  test('outer over inner is 100.04 at standstill and 1.436 at slip 0.05', () => {
    within(ratio(1), 100.04, 1e-4)
    within(ratio(0.05), 1.436, 5e-4)
  })

  test('the double cage of both has the sum of the two torques', () => {
    const { cages, ...stator } = singleCage(0, 0, noMagnetising, 0.01, 0.5)
    const outer = singleCage(0, 0, noMagnetising, 0.05, 0.1).cages
    const both = { circuit: { ...stator, cages: [...cages, ...outer] }, voltage: 1, frequency: 50, poles: 4 }
    for (const slip of [1, 0.3, 0.05])
      within(atTerminals(both, slip).torque, cageTorque(0.05, 0.1, slip) + cageTorque(0.01, 0.5, slip), 1e-6)
  })
})

describe('FOSSEE textbook companion 3745, example 1.44: torques of two cages, stator left out', () => {
  test('1 + j1 Ω over 0.2 + j4 Ω is 40.1 at standstill and 0.399 at slip 0.05', () => {
    const ratio = (slip: number) => cageTorque(1, 1, slip) / cageTorque(0.2, 4, slip)
    within(ratio(1), 40.1, 1e-3)
    within(ratio(0.05), 0.399, 2e-3)
  })
})

// Inputs also in a second public companion (Chakrabarti, ex. 10.9); both slip in the last step, answers recomputed.
describe('Kothari and Nagrath, Electric Machines, example 9.11: slip rings, 3000 V, 50 Hz, 6 poles, turns 3.6', () => {
  const turns = 3.6 ** 2
  const motor = {
    circuit: singleCage(0, 0, noMagnetising, 0.1 * turns, 2 * Math.PI * 50 * 3.61e-3 * turns),
    voltage: 3000,
    frequency: 50,
    poles: 6,
  }

  test('rings shorted: 117.4 A and 511.6 N·m', () => {
    const { lineCurrent, torque } = startOf({ ...motor, starter: direct }).standstill
    within(lineCurrent, 117.4, 1e-3)
    within(torque, 511.6, 1e-3)
  })

  test('4.208 Ω in each rotor phase, 54.54 Ω on the stator side: 30 A and 1439.5 N·m', () => {
    expect(4.208 * turns).toBeCloseTo(54.54, 2)
    const starter: Starter = {
      kind: 'rotor-resistance',
      steps: [{ resistance: ohm(4.208 * turns), changeOver: { kind: 'time', at: second(1e6) } }],
    }
    const { lineCurrent, torque } = startOf({ ...motor, starter }).standstill
    within(lineCurrent, 30, 1e-3)
    within(torque, 1439.5, 1e-3)
  })
})
