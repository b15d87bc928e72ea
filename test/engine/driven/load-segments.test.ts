import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import type { LoadCurve } from '@/lib/engine/case-input'
import { loadSegments, loadTorque, loadTorqueAt, pieceAt } from '@/lib/engine/driven/load-segments'
import { newtonMetre, radianPerSecond } from '@/lib/units/si'
import { fromRpm } from '@/lib/units/speed'

const pump: LoadCurve = {
  kind: 'power',
  constant: newtonMetre(300),
  atRated: newtonMetre(4300),
  ratedSpeed: fromRpm(992),
  exponent: 2,
  breakaway: { torque: newtonMetre(1400), until: fromRpm(60) },
}

const points: LoadCurve = {
  kind: 'points',
  speeds: [0, 60, 200, 780].map(fromRpm),
  torques: [1400, 315, 463, 2773].map(newtonMetre),
}

describe('a load curve', () => {
  it('of a power is T₀ + (T_r − T₀)(n/n_r)² past its breakaway', () => {
    const load = loadSegments(pump)
    expect(loadTorqueAt(load, fromRpm(992))).toBeCloseTo(4300, 9)
    expect(loadTorqueAt(load, fromRpm(496))).toBeCloseTo(1300, 9)
  })

  it('falls straight from the breakaway torque to the curve', () => {
    const load = loadSegments(pump)
    const there = 300 + 4000 * (60 / 992) ** 2
    expect(loadTorqueAt(load, 0)).toBe(1400)
    expect(loadTorqueAt(load, fromRpm(30))).toBeCloseTo((1400 + there) / 2, 9)
    expect(loadTorqueAt(load, fromRpm(60))).toBeCloseTo(there, 9)
  })

  it('of points joins them by straight lines and prolongs the last', () => {
    const load = loadSegments(points)
    expect(loadTorqueAt(load, fromRpm(60))).toBeCloseTo(315, 9)
    expect(loadTorqueAt(load, fromRpm(490))).toBeCloseTo((463 + 2773) / 2, 9)
    expect(loadTorqueAt(load, fromRpm(838))).toBeCloseTo(2773 + (58 * (2773 - 463)) / 580, 9)
  })

  it('of one point is constant', () => {
    const load = loadSegments({ kind: 'points', speeds: [radianPerSecond(0)], torques: [newtonMetre(70)] })
    expect(loadTorqueAt(load, 0)).toBe(70)
    expect(loadTorqueAt(load, 100)).toBe(70)
  })

  it('of exponent zero is constant from standstill on', () => {
    const constant = loadSegments({ ...pump, constant: newtonMetre(0), exponent: 0, breakaway: null })
    expect(loadTorqueAt(constant, 0)).toBe(4300)
    expect(loadTorqueAt(constant, 50)).toBe(4300)
  })

  it('of any exponent goes through its constant part and its rated point', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 40 }), (tenths) => {
        const load = loadSegments({ ...pump, exponent: tenths / 10, breakaway: null })
        expect(loadTorqueAt(load, 0)).toBeCloseTo(300, 9)
        expect(loadTorqueAt(load, fromRpm(992))).toBeCloseTo(4300, 8)
      }),
    )
  })

  it('has no jump at its corners', () => {
    for (const curve of [pump, points]) {
      const load = loadSegments(curve)
      load.corners.forEach((corner, piece) => {
        expect(loadTorque(load, piece, corner)).toBeCloseTo(loadTorque(load, piece + 1, corner), 9)
      })
    }
  })

  it('counts a corner to the piece above it', () => {
    const load = loadSegments(points)
    expect(load.corners.length).toBe(2)
    expect(pieceAt(load, 0)).toBe(0)
    expect(pieceAt(load, load.corners[0]!)).toBe(1)
    expect(pieceAt(load, 1000)).toBe(2)
  })

  it('can be prolonged past a corner on the same piece, so that a step sees it smooth', () => {
    const load = loadSegments(points)
    const slope = (315 - 1400) / fromRpm(60)
    expect(loadTorque(load, 0, fromRpm(80))).toBeCloseTo(1400 + slope * fromRpm(80), 9)
  })
})
