import { describe, expect, test } from 'vitest'
import { radianPerSecond } from '@/lib/units/si'
import { toRpm } from '@/lib/units/speed'
import { atTerminals, breakdown } from './support/at-terminals'
import { startOf } from './support/one-motor-case'
import { singleCage } from './support/single-cage'
import { within } from './support/within'

describe('Fitzgerald, Kingsley, Umans, Electric Machinery, examples 6.2 and 6.3 (from memory, recomputed): 220 V, 10 hp, 6 poles', () => {
  const motor = { circuit: singleCage(0.294, 0.503, 13.25, 0.144, 0.209), voltage: 220, frequency: 60, poles: 6 }

  test('at slip 2 %: 18.8 A, power factor 0.845, airgap 5740 W, output 5220 W, 42.4 N·m', () => {
    const at = atTerminals(motor, 0.02)
    within(at.current, 18.8, 2e-3)
    within(at.powerFactor, 0.845, 1e-3)
    within(at.airgapPower, 5740, 1e-3)
    // Friction, windage and core loss of 403 W are taken off the converted power.
    const output = at.converted - 403
    within(output, 5220, 1e-3)
    const speed = (0.98 * 1200 * Math.PI) / 30
    expect(toRpm(radianPerSecond(speed))).toBeCloseTo(1176, 9)
    within(output / speed, 42.4, 1e-3)
  })

  test('at slip 3 %: rotor current 23.9 A, 65.4 N·m', () => {
    const at = atTerminals(motor, 0.03)
    within(at.rotorCurrent, 23.9, 1e-3)
    within(at.torque, 65.4, 1e-3)
  })

  test('breakdown 175 N·m at slip 0.192 and 970 r/min', () => {
    const { slip, torque } = breakdown(motor)
    within(torque, 175, 4e-3)
    expect(slip).toBeCloseTo(0.192, 3)
    within(1200 * (1 - slip), 970, 1e-3)
  })

  test('starting: rotor current 150 A, 77.6 N·m', () => {
    within(atTerminals(motor, 1).rotorCurrent, 150, 3e-3)
    within(startOf(motor).standstill.torque, 77.6, 1e-3)
  })
})
