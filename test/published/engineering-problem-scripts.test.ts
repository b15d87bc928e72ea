import { describe, expect, test } from 'vitest'
import type { LoadCurve } from '@/lib/engine/case-input'
import { newtonMetre } from '@/lib/units/si'
import { fromRpm, toRpm } from '@/lib/units/speed'
import { atTerminals } from './support/at-terminals'
import { type OneMotor, startOf } from './support/one-motor-case'
import { singleCage } from './support/single-cage'
import { within } from './support/within'

/** 3.2·(1 − s) + 58.9·(1 − s)² N·m in straight pieces of 1 r/min: within 3e-5 N·m of the curve. */
const load: LoadCurve = {
  kind: 'points',
  speeds: Array.from({ length: 1501 }, (_, rpm) => fromRpm(rpm)),
  torques: Array.from({ length: 1501 }, (_, rpm) => newtonMetre(3.2 * (rpm / 1500) + 58.9 * (rpm / 1500) ** 2)),
}

const motor: OneMotor = {
  circuit: singleCage(0.5, 1.5, 40, 0.625, 1.25, 360),
  voltage: 380,
  frequency: 50,
  poles: 4,
  inertia: 2.1,
  load,
}

/*
 * Inputs seen in an open Catalan collection of scripts for electrical-engineering problems (teaching material signed
 * "josep"); its printed answers were not seen: answers recomputed.
 */
describe('open Catalan collection of electrical-engineering problem scripts (inputs seen, answers recomputed): a run-up at three voltages', () => {
  const rows = [
    [1, 1430.8, 16.576, 0.8842, 56.64, 74.935, 62.806, [3.505, 3.765, 4.055, 4.26, 4.914]],
    [0.9, 1413.5, 17.892, 0.8902, 55.32, 67.441, 50.873, [4.441, 4.786, 5.171, 5.441, 6.302]],
    [0.8, 1388, 19.633, 0.8866, 53.4, 59.948, 40.196, [5.841, 6.333, 6.879, 7.26, 8.473]],
  ] as const

  test.each(rows)(
    'at %d of 380 V it settles at %d r/min',
    (part, rpm, current, powerFactor, torque, locked, lockedTorque) => {
      const start = startOf({ ...motor, supply: part * 380, timeLimit: 60, ratedSpeed: fromRpm(1300) })
      expect(start.settledSpeed).not.toBeNull()
      const settled = start.settledSpeed!
      expect(toRpm(settled)).toBeCloseTo(rpm, 0.7)
      const at = atTerminals({ ...motor, voltage: part * 380 }, 1 - toRpm(settled) / 1500)
      within(at.current, current, 1e-4)
      expect(at.powerFactor).toBeCloseTo(powerFactor, 4)
      within(at.torque, torque, 3e-4)
      within(start.standstill.lineCurrent, locked, 1e-4)
      within(start.standstill.torque, lockedTorque, 1e-4)
    },
  )

  test.each(rows)('at %d of 380 V the times to 90, 95, 98, 99 and 99.9 %% of the final speed', (part, ...row) => {
    const times = row[6]
    const supply = part * 380
    const final = startOf({ ...motor, supply, ratedSpeed: fromRpm(1300) }).settledSpeed!
    ;[0.9, 0.95, 0.98, 0.99, 0.999].forEach((criterion, i) => {
      const start = startOf({ ...motor, supply, ratedSpeed: final, criterion })
      within(start.timeToCriterion!, times[i]!, 5e-4)
      if (i > 0) within(start.timeTo95!, times[1], 5e-4)
    })
  })

  test('starting torque falls with the square of the voltage: 62.806 × 0.64 = 40.196', () => {
    const torque = (part: number) => startOf({ ...motor, supply: part * 380 }).standstill.torque
    within(torque(0.8), 0.64 * torque(1), 1e-6)
  })
})
