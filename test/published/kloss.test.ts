import { describe, expect, test } from 'vitest'
import { atTerminals, breakdown } from './support/at-terminals'
import { noLoad, startOf } from './support/one-motor-case'
import { noMagnetising, singleCage } from './support/single-cage'
import { within } from './support/within'

const machine = (r1: number) => ({
  circuit: singleCage(r1, 0.3, noMagnetising, 0.12, 0.4),
  voltage: 400,
  frequency: 50,
  poles: 4,
})

describe('Kloss, relation of torque and slip (textbook identity, from memory)', () => {
  test('without stator resistance T/T_b = 2/(s/s_b + s_b/s): 0.8 at half and at twice s_b, 0.19802 at a tenth', () => {
    const { slip, torque } = breakdown(machine(0))
    expect(slip).toBeCloseTo(0.12 / 0.7, 7)
    for (const [part, ratio] of [
      [0.5, 0.8],
      [2, 0.8],
      [0.1, 0.19802],
    ] as const)
      expect(atTerminals(machine(0), part * slip).torque / torque).toBeCloseTo(ratio, 5)
  })

  test('with stator resistance T/T_b = 2(1 + a·s_b)/(s/s_b + s_b/s + 2a·s_b), a = R₁/R₂', () => {
    const { slip: b, torque } = breakdown(machine(0.15))
    const a = 0.15 / 0.12
    for (const s of [0.01, 0.05, b, 0.3, 1]) {
      const kloss = (2 * (1 + a * b)) / (s / b + b / s + 2 * a * b)
      within(atTerminals(machine(0.15), s).torque / torque, kloss, 1e-7)
    }
  })

  test('breakdown torque does not depend on rotor resistance and its slip is proportional to it', () => {
    const doubled = { ...machine(0.15), circuit: singleCage(0.15, 0.3, noMagnetising, 0.24, 0.4) }
    within(breakdown(doubled).torque, breakdown(machine(0.15)).torque, 1e-9)
    within(breakdown(doubled).slip, 2 * breakdown(machine(0.15)).slip, 1e-6)
  })

  test('rotor current at breakdown is 0.707 of its limit at great slip where the stator has no resistance', () => {
    const { slip } = breakdown(machine(0))
    const limit = 400 / Math.sqrt(3) / 0.7
    within(atTerminals(machine(0), slip).current, limit / Math.SQRT2, 1e-6)
  })
})

describe('Kloss, integrated over an unloaded run-up (textbook closed form, from memory)', () => {
  const inertia = 20
  const motor = { ...machine(0.15), inertia, load: noLoad, ratedSpeed: 0.99 * 50 * Math.PI }
  const start = startOf(motor)
  const synchronous = 50 * Math.PI
  const slip = 1 - 0.98 * 0.99

  test('time from standstill to slip s is J·ω_s/(2T_b(1 + a·s_b))·[(1 − s²)/(2s_b) + s_b·ln(1/s) + 2a·s_b(1 − s)]', () => {
    const { slip: b, torque } = breakdown(motor)
    const a = 0.15 / 0.12
    const path = (1 - slip ** 2) / (2 * b) + b * Math.log(1 / slip) + 2 * a * b * (1 - slip)
    const time = ((inertia * synchronous) / (2 * torque * (1 + a * b))) * path
    within(start.timeToCriterion!, time, 1e-6)
  })

  test('rotor heat is J·ω_s²(1 − s²)/2, whatever the torque', () => {
    within(start.slipEnergy, (inertia * synchronous ** 2 * (1 - slip ** 2)) / 2, 1e-6)
    const weak = startOf({ ...motor, supply: 200 })
    within(weak.slipEnergy, start.slipEnergy, 1e-6)
  })
})
