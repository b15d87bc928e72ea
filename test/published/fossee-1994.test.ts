import { describe, test } from 'vitest'
import { atTerminals, breakdown } from './support/at-terminals'
import { startOf } from './support/one-motor-case'
import { noMagnetising, singleCage } from './support/single-cage'
import { within } from './support/within'

describe('FOSSEE textbook companion 1994, example 10.19: 12 poles, 50 Hz, rotor 0.15 + j0.25 Ω at 32 V a phase', () => {
  const motor = {
    circuit: singleCage(0, 0, noMagnetising, 0.15, 0.25),
    voltage: 32 * Math.sqrt(3),
    frequency: 50,
    poles: 12,
  }

  test('starting torque 103.54 N·m, full-load torque 15.58 N·m at 480 r/min', () => {
    within(startOf(motor).standstill.torque, 103.54, 2e-3)
    within(atTerminals(motor, 20 / 500).torque, 15.58, 2e-3)
  })

  test('largest torque 117.34 N·m at 200 r/min', () => {
    const { slip, torque } = breakdown(motor)
    within(torque, 117.34, 2e-3)
    within(500 * (1 - slip), 200, 1e-4)
  })
})
