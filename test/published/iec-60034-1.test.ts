import { describe, expect, test } from 'vitest'
import {
  declaredTolerance,
  leastEfficiency,
  leastPowerFactor,
  slipRange,
} from '@/lib/study/nameplate/standard-tolerances'

describe('IEC 60034-1, clause 12 (from memory): tolerances on declared values', () => {
  test('efficiency 0.95 may be 0.9425 at 100 kW and 0.945 at 200 kW', () => {
    expect(leastEfficiency(0.95, 100e3)).toBeCloseTo(0.9425, 12)
    expect(leastEfficiency(0.95, 150e3)).toBeCloseTo(0.9425, 12)
    expect(leastEfficiency(0.95, 200e3)).toBeCloseTo(0.945, 12)
  })

  test('power factor 0.85 may be 0.825, 0.95 no less than 0.93, 0.5 no less than 0.43', () => {
    expect(leastPowerFactor(0.85)).toBeCloseTo(0.825, 12)
    expect(leastPowerFactor(0.95)).toBeCloseTo(0.93, 12)
    expect(leastPowerFactor(0.5)).toBeCloseTo(0.43, 12)
  })

  test('locked-rotor current to +20 %, locked-rotor torque −15 % to +25 %, breakdown −10 %, inertia ±10 %', () => {
    expect(declaredTolerance.lockedRotorCurrent).toEqual({ least: null, most: 1.2 })
    expect(declaredTolerance.lockedRotorTorque).toEqual({ least: 0.85, most: 1.25 })
    expect(declaredTolerance.breakdownTorque.least).toBe(0.9)
    expect(declaredTolerance.inertia).toEqual({ least: 0.9, most: 1.1 })
  })

  test('slip ±20 % from 1 kW on, ±30 % below', () => {
    expect(slipRange(0.01, 1e3)).toEqual({ least: 0.008, most: 0.012 })
    expect(slipRange(0.1, 500).most).toBeCloseTo(0.13, 12)
  })
})
