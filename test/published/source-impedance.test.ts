import { describe, expect, test } from 'vitest'
import { impedanceByAngle } from '@/lib/study/to-engine/impedance-by-angle'
import { within } from './support/within'

describe('IEC 60909-0 (from memory, recomputed): a feeder split by its X/R', () => {
  test.each([
    [5, 0.98058, 0.19612],
    [10, 0.99504, 0.0995],
    [15, 0.99779, 0.06652],
  ])('X/R %d: X %d and R %d of the impedance', (ratio, x, r) => {
    const impedance = impedanceByAngle(1, ratio)
    expect(impedance.im).toBeCloseTo(x, 5)
    expect(impedance.re).toBeCloseTo(r, 5)
  })
})

/*
 * The page's split (X 0.232, R 0.046 Ω) does not give back its own 0.2541 Ω; the correct one is held here.
 */
describe('industrialmonitordirect.com, 11 kV feeder of 500 MVA with c = 1.05 and X/R 5 (published with an error, corrected)', () => {
  test('0.25410 Ω is X 0.24917 Ω and R 0.04983 Ω', () => {
    const impedance = impedanceByAngle((1.05 * 11_000 ** 2) / 500e6, 5)
    expect(Math.hypot(impedance.re, impedance.im)).toBeCloseTo(0.2541, 5)
    within(impedance.im, 0.24917, 1e-4)
    within(impedance.re, 0.04983, 1e-3)
  })
})
